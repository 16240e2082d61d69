import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../../units/convert';
import { kelvin, type Kelvin } from '../../units/quantity';
import { fahrenheit } from '../readings.fixture';
import { waterVapourPressure, WATER_TRIPLE_POINT_K } from './water-vapour';

function pascals(temperature: Kelvin): number {
  const result = waterVapourPressure(temperature);
  if (!result.ok) throw new Error(result.reason);
  return result.pressure;
}

const microns = (temperature: Kelvin): number => pascals(temperature) / toSi(1, 'micron');

/** W. Wagner and A. Pruss, saturation pressure of liquid water, IAPWS SR1-86(1992), from memory: another formula. */
function iapwsLiquidPa(t: number): number {
  const v = 1 - t / 647.096;
  const sum =
    -7.85951783 * v +
    1.84408259 * v ** 1.5 -
    11.7866497 * v ** 3 +
    22.6807411 * v ** 3.5 -
    15.9618719 * v ** 4 +
    1.80122502 * v ** 7.5;
  return 22.064e6 * Math.exp((647.096 / t) * sum);
}

describe('waterVapourPressure', () => {
  // Worked from the IAPWS and Murphy–Koop formulas elsewhere; to their four figures.
  it.each([
    [32, 4585],
    [40, 6296],
    [50, 9212],
    [60, 13260],
    [70, 18790],
    [72, 20110],
    [80, 26240],
  ])('of water at %d °F is %d µm', (degF, expected) => {
    expect(Math.abs(microns(fahrenheit(degF)) / expected - 1)).toBeLessThan(5e-4);
  });

  it.each([
    [20, 2611],
    [0, 957],
    [-20, 320],
    [-40, 96],
  ])('of ice at %d °F is %d µm', (degF, expected) => {
    expect(Math.abs(microns(fahrenheit(degF)) - expected)).toBeLessThan(1);
    expect(waterVapourPressure(fahrenheit(degF))).toMatchObject({ ok: true, over: 'ice' });
  });

  // Table of the vapour pressure of water of a public encyclopedia. Its 17.54 is an older value: IAPWS has 17.546.
  it.each([
    [0, 4.585, 0.001],
    [10, 9.21, 0.005],
    [20, 17.54, 0.01],
  ])('is at %d °C the printed %d torr', (degC, torr, tolerance) => {
    const inTorr = convert(microns(kelvin(toSi(degC, 'degC'))), 'micron', 'Torr');
    expect(Math.abs(inTorr - torr)).toBeLessThanOrEqual(tolerance);
  });

  // Triple point of water: 611.657 Pa (IAPWS).
  it('meets at the triple point from both sides', () => {
    expect(pascals(kelvin(WATER_TRIPLE_POINT_K))).toBeCloseTo(611.66, 1);
    expect(pascals(kelvin(WATER_TRIPLE_POINT_K - 1e-9))).toBeCloseTo(611.66, 1);
    expect(waterVapourPressure(kelvin(WATER_TRIPLE_POINT_K))).toMatchObject({ over: 'liquid' });
  });

  it('agrees with IAPWS over liquid to 0.05 %', () => {
    fc.assert(
      fc.property(fc.double({ min: WATER_TRIPLE_POINT_K, max: 332, noNaN: true }), (t) => {
        expect(Math.abs(pascals(kelvin(t)) / iapwsLiquidPa(t) - 1)).toBeLessThan(5e-4);
      }),
    );
  });

  it('rises with the temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: 150, max: 331, noNaN: true }), (t) => {
        expect(pascals(kelvin(t + 0.5))).toBeGreaterThan(pascals(kelvin(t)));
      }),
    );
  });

  it.each([
    [109.9, 'belowRange'],
    [332.1, 'aboveRange'],
    [NaN, 'notFinite'],
    [Infinity, 'notFinite'],
  ])('has none at %d K: %s', (t, reason) => {
    expect(waterVapourPressure(kelvin(t))).toEqual({ ok: false, reason });
  });
});
