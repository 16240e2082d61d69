import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../units/convert';
import { metre, pascalAbsolute, pascalGauge } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, standardAtmosphere, toAbsolute, toGauge } from './gauge-pressure';

const pressureAt = (elevationM: number): number => {
  const result = standardAtmosphere(metre(elevationM));
  return result.ok ? result.pressure : NaN;
};

describe('standardAtmosphere', () => {
  // US Standard Atmosphere 1976, tables as shown by UCSC, Engineers Edge and Engineering ToolBox; ±0.005 psia.
  it.each([
    [-1000, 15.236, 105.05],
    [0, 14.696, 101.33],
    [1000, 14.173, 97.72],
    [2000, 13.664, 94.21],
    [3000, 13.171, 90.81],
    [4000, 12.692, 87.51],
    [5000, 12.228, 84.31],
    [5280, 12.1, 83.43],
    [7000, 11.34, 78.19],
    [10000, 10.107, 69.68],
  ])('at %d ft is %d psia and %d kPa', (feet, psia, kilopascals) => {
    const pressure = pressureAt(toSi(feet, 'ft'));
    expect(Math.abs(convert(pressure, 'Pa', 'psia') - psia)).toBeLessThanOrEqual(0.005);
    expect(Math.abs(convert(pressure, 'Pa', 'kPaa') - kilopascals)).toBeLessThanOrEqual(0.015);
  });

  it.each([
    [0, 29.92],
    [1000, 28.86],
    [2000, 27.82],
    [3000, 26.82],
    [4000, 25.84],
    [5000, 24.9],
    [5280, 24.64],
    [7000, 23.09],
    [10000, 20.58],
  ])('at %d ft is %d inHg', (feet, expected) => {
    expect(Math.abs(convert(pressureAt(toSi(feet, 'ft')), 'Pa', 'inHg') - expected)).toBeLessThanOrEqual(
      0.01,
    );
  });

  // US Standard Atmosphere 1976, geopotential heights, from memory.
  it.each([
    [1000, 89874.6],
    [2000, 79495.2],
    [3000, 70108.5],
    [5000, 54019.9],
    [11000, 22632.1],
  ])('at %d m is %d Pa', (elevationM, expected) => {
    expect(Math.abs(pressureAt(elevationM) - expected)).toBeLessThanOrEqual(3);
  });

  it('answers from −500 to 11 000 m and says why not beyond', () => {
    expect(standardAtmosphere(metre(-500)).ok).toBe(true);
    expect(standardAtmosphere(metre(11000)).ok).toBe(true);
    expect(standardAtmosphere(metre(-500.1))).toEqual({ ok: false, reason: 'belowRange' });
    expect(standardAtmosphere(metre(11000.1))).toEqual({ ok: false, reason: 'aboveRange' });
    expect(standardAtmosphere(metre(NaN))).toEqual({ ok: false, reason: 'notFinite' });
  });

  it('falls with elevation', () => {
    fc.assert(
      fc.property(fc.integer({ min: -500, max: 10999 }), (elevationM) => {
        expect(pressureAt(elevationM + 1)).toBeLessThan(pressureAt(elevationM));
      }),
    );
  });
});

describe('toAbsolute and toGauge', () => {
  it('make 0 kPa gauge 101.325 kPa absolute at sea level', () => {
    expect(toAbsolute(pascalGauge(0), SEA_LEVEL_ATMOSPHERE)).toBe(101325);
  });

  it('show a perfect vacuum as minus one atmosphere', () => {
    expect(toGauge(pascalAbsolute(0), SEA_LEVEL_ATMOSPHERE)).toBe(-101325);
  });

  it('are each other’s opposite', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -101325, max: 1e7 }),
        fc.integer({ min: 6e4, max: 1.1e5 }),
        (gauge, atmosphere) => {
          const absolute = toAbsolute(pascalGauge(gauge), pascalAbsolute(atmosphere));
          expect(toGauge(absolute, pascalAbsolute(atmosphere))).toBe(gauge);
        },
      ),
    );
  });
});
