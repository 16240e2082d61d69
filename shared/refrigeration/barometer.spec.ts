import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../units/convert';
import { metre, pascalAbsolute } from '../units/quantity';
import { atmosphereFromBarometer } from './barometer';
import { standardAtmosphere } from './gauge-pressure';
import { atmosphereAtFeet } from './readings.fixture';

const feet = (value: number) => metre(toSi(value, 'ft'));
const inHg = (value: number) => pascalAbsolute(toSi(value, 'inHg'));

describe('atmosphereFromBarometer', () => {
  // US Standard Atmosphere 1976 in inches of mercury: 29.92 at sea level, 24.90 at 5000 ft, 20.58 at 10 000 ft.
  it.each([
    [29.92, 0],
    [24.9, 5000],
    [20.58, 10000],
    [30.8, 0],
    [29.1, 0],
    [24.2, 5000],
  ])('has nothing against %d inHg at %d ft', (reading, elevation) => {
    expect(atmosphereFromBarometer(inHg(reading), feet(elevation))).toEqual({
      ok: true,
      pressure: inHg(reading),
      doubt: null,
      uncorrected: null,
    });
  });

  it.each([2000, 5280, 7000, 10000])(
    'asks about 30.0 inHg at %d ft: what a weather report says',
    (elevation) => {
      const result = atmosphereFromBarometer(inHg(30), feet(elevation));
      if (!result.ok) throw new Error(result.reason);
      expect(result.doubt).toBe('seaLevelCorrected');
      expect((result.uncorrected ?? NaN) / atmosphereAtFeet(elevation)).toBeCloseTo(30 / 29.921, 3);
    },
  );

  // 12.100 psia at 5280 ft.
  it('says what a standard day’s report means at 5280 ft', () => {
    const result = atmosphereFromBarometer(pascalAbsolute(101325), feet(5280));
    expect(result.ok && convert(result.uncorrected ?? NaN, 'Pa', 'psia')).toBeCloseTo(12.1, 2);
  });

  it('asks about what is neither the site’s nor sea level’s', () => {
    expect(atmosphereFromBarometer(inHg(24.9), feet(0))).toMatchObject({
      doubt: 'farFromElevation',
      uncorrected: null,
    });
    expect(atmosphereFromBarometer(inHg(27), feet(7000))).toMatchObject({ doubt: 'farFromElevation' });
  });

  it('can’t doubt without an elevation', () => {
    expect(atmosphereFromBarometer(inHg(30))).toMatchObject({ ok: true, doubt: null });
    expect(atmosphereFromBarometer(inHg(30), metre(NaN))).toMatchObject({ ok: true, doubt: null });
  });

  it.each([
    [49_999, 'belowRange'],
    [108_001, 'aboveRange'],
    [0, 'belowRange'],
    [NaN, 'notFinite'],
    [Infinity, 'notFinite'],
  ])('refuses %d Pa: %s', (reading, reason) => {
    expect(atmosphereFromBarometer(pascalAbsolute(reading), feet(0))).toEqual({ ok: false, reason });
  });

  it('leaves every standard day in any weather alone', () => {
    const cases = fc.tuple(
      fc.double({ min: 0, max: 4000, noNaN: true }),
      fc.double({ min: 0.97, max: 1.03, noNaN: true }),
    );
    fc.assert(
      fc.property(cases, ([elevation, weather]) => {
        const usual = standardAtmosphere(metre(elevation));
        const reading = pascalAbsolute((usual.ok ? usual.pressure : NaN) * weather);
        expect(atmosphereFromBarometer(reading, metre(elevation))).toMatchObject({ ok: true, doubt: null });
      }),
    );
  });
});
