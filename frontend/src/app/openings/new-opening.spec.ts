import { describe, expect, it } from '@jest/globals';
import { isTimeZone, readElevation, toNewOpening, type TypedOpening } from './new-opening';

const typed: TypedOpening = {
  name: ' Juniper Street ',
  address: '',
  elevation: '5,280',
  openingDate: '2026-06-01',
  timeZone: 'America/Denver',
  contractorName: '',
  unitSystem: 'us',
  language: 'en',
};

describe('readElevation', () => {
  it('takes feet in US units and gives the atmosphere of the place', () => {
    const elevation = readElevation('5280', 'us');
    expect(elevation).toMatchObject({ ok: true });
    if (!elevation.ok) return;
    expect(elevation.metres).toBeCloseTo(1609.344, 3);
    expect(elevation.atmospherePaAbs).toBeCloseTo(83_430, -2);
  });

  it('takes metres in SI units', () => {
    expect(readElevation('0', 'si')).toEqual({ ok: true, metres: 0, atmospherePaAbs: 101_325 });
  });

  it.each([
    ['', 'empty'],
    ['high', 'notANumber'],
    ['60000', 'outOfRange'],
    ['-3000', 'outOfRange'],
  ])('refuses %p as %s', (text, reason) => {
    expect(readElevation(text, 'us')).toEqual({ ok: false, reason });
  });
});

describe('toNewOpening', () => {
  it('sends the elevation in metres and trimmed words', () => {
    expect(toNewOpening(typed)).toMatchObject({
      name: 'Juniper Street',
      elevationM: 1609.344,
      timeZone: 'America/Denver',
    });
  });

  it.each([
    ['no name', { name: '  ' }],
    ['no date', { openingDate: '' }],
    ['no elevation', { elevation: '' }],
  ])('is null with %s', (_case, change) => {
    expect(toNewOpening({ ...typed, ...change })).toBeNull();
  });
});

describe('isTimeZone', () => {
  it('knows IANA names only', () => {
    expect(isTimeZone('America/Chicago')).toBe(true);
    expect(isTimeZone('Chicago time')).toBe(false);
    expect(isTimeZone('')).toBe(false);
  });
});
