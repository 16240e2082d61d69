import { describe, expect, it } from '@jest/globals';
import { readDate } from './calendar-date';
import { DateTimes, readClock } from './clock-time';

describe('readClock', () => {
  it.each([
    ['14:05', 'ofDay', 50_700],
    ['2:05 PM', 'ofDay', 50_700],
    ['12:00 AM', 'ofDay', 0],
    ['12:30pm', 'ofDay', 45_000],
    ['01:00:00+02:00', 'ofDay', -3600],
    ['01:00:00-0530', 'ofDay', 23_400],
    ['25:00', 'elapsed', 90_000],
    ['90:30', 'minutes', 5430],
    ['24:00', 'ofDay', NaN],
    ['10:60', 'ofDay', NaN],
    ['10:00:60', 'ofDay', NaN],
    ['13:00 PM', 'ofDay', NaN],
    ['0:30 AM', 'ofDay', NaN],
    ['10', 'ofDay', NaN],
    ['10:5', 'ofDay', NaN],
    ['', 'ofDay', NaN],
  ] as const)('reads %j (%s) as %d s', (text, style, expected) => {
    expect(readClock(text, style)).toBe(expected);
  });
});

describe('readDate', () => {
  const day = (iso: string): number => Date.parse(`${iso}T00:00:00Z`) / 1000;

  it.each([
    ['2026-05-06', '2026-05-06', '2026-05-06'],
    ['2026/05/06', '2026-05-06', '2026-05-06'],
    ['06.05.2026', '2026-05-06', '2026-05-06'],
    ['05/06/2026', '2026-05-06', '2026-06-05'],
    ['5-6-26', '2026-05-06', '2026-06-05'],
    ['02/29/2028', '2028-02-29', null],
    ['29/02/2028', null, '2028-02-29'],
  ])('reads %s month first as %s and day first as %s', (text, monthFirst, dayFirst) => {
    expect(readDate(text)).toEqual({
      monthFirstS: monthFirst === null ? NaN : day(monthFirst),
      dayFirstS: dayFirst === null ? NaN : day(dayFirst),
    });
  });

  it.each(['2026-02-30', '30.02.2026', '13/13/2026', '1/2/326', '2026-05', '05/06-2026', '', '5'])(
    'reads no date in %j',
    (text) => {
      expect(readDate(text)).toBeUndefined();
    },
  );
});

describe('DateTimes', () => {
  it('reads many dates without keeping them all, and the same each time', () => {
    const dates = new DateTimes();
    for (let year = 1000; year < 2500; year++) expect(dates.date(`${year}-01-01`)?.dayFirstS).not.toBeNaN();
    expect(dates.dateTime('2026-01-05T10:00:00Z')).toEqual(dates.dateTime('2026-01-05 10:00'));
    expect(dates.dateTime('2026-01-05')).toBeUndefined();
    expect(dates.dateTime('2026-01-05 soon')).toBeUndefined();
    expect(dates.together('', '10:00')).toBeUndefined();
  });
});
