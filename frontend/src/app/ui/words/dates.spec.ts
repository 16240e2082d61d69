import { describe, expect, it } from '@jest/globals';
import { dayOf, daysBetween, formatDay, formatMoment } from './dates';

describe('formatDay', () => {
  it('is the same day for every reader', () => {
    expect(formatDay('2026-03-01', 'en')).toBe('Mar 1, 2026');
    expect(formatDay('2026-03-01', 'es')).toBe('1 mar 2026');
  });

  it('gives back what is no date', () => {
    expect(formatDay('soon', 'en')).toBe('soon');
  });
});

describe('formatMoment', () => {
  it('reads on the clock of the store', () => {
    expect(formatMoment('2026-03-01T03:30:00Z', 'en', 'America/Denver')).toMatch(
      /^Feb 28, 2026, 8:30\sPM MST$/,
    );
    expect(formatMoment('2026-03-01T03:30:00Z', 'es', 'America/Denver')).toMatch(/28 feb 2026, 8:30.*MST$/);
  });

  it('still gives a time where the zone is unknown', () => {
    expect(formatMoment('2026-03-01T03:30:00Z', 'en', 'Nowhere/Else')).toMatch(/2026.*\d$|2026.*M$/);
  });
});

describe('daysBetween', () => {
  it.each([
    ['2026-03-01', '2026-03-10', 9],
    ['2026-03-07', '2026-03-09', 2],
    ['2026-03-10', '2026-03-10', 0],
    ['2026-03-12', '2026-03-10', -2],
  ])('counts from %s to %s: %i', (from, to, days) => {
    expect(daysBetween(from, to)).toBe(days);
  });
});

describe('dayOf', () => {
  it('is the calendar day of the zone', () => {
    expect(dayOf(new Date('2026-03-01T03:30:00Z'), 'America/Denver')).toBe('2026-02-28');
  });
});
