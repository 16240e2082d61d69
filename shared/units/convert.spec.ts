import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, fromSi, toSi, UnitMismatch } from './convert';
import { UNITS, type UnitId } from './unit';

const UNIT_IDS = Object.keys(UNITS) as UnitId[];

/** Half a unit of the last digit that the expectation is stated to, as a number of digits for toBeCloseTo. */
type Row = readonly [value: number, from: UnitId, to: UnitId, expected: number, digits: number];

describe('convert', () => {
  // Definitions and NIST SP 811 (2008); the last factors from memory of it. Digits are those of the published figure.
  it.each<Row>([
    [10, 'degC', 'degF', 50, 10],
    [-40, 'degC', 'degF', -40, 10],
    [-40, 'degF', 'degC', -40, 10],
    [0, 'degF', 'K', 255.372, 3],
    [0, 'degC', 'K', 273.15, 10],
    [10, 'K_diff', 'degF_diff', 18, 10],
    [10, 'degF_diff', 'K_diff', 5.5556, 4],
    [1, 'K_diff', 'degF_diff', 1.8, 10],
    [-3, 'degF_diff', 'K_diff', -1.667, 3],
    [10, 'degC_diff', 'degF_diff', 18, 10],
    [1, 'psig', 'kPag', 6.894757, 6],
    [1, 'barg', 'psig', 14.503774, 6],
    [1, 'bara', 'psia', 14.503774, 6],
    [101.325, 'kPaa', 'Pa', 101325, 6],
    [1, 'psi_diff', 'Pa_diff', 6894.757, 3],
    [1, 'bar_diff', 'psi_diff', 14.503774, 6],
    [-2, 'psi_diff', 'kPa_diff', -13.789515, 6],
    [100, 'kPa_diff', 'bar_diff', 1, 12],
    [500, 'micron', 'Pa_vac', 66.6612, 4],
    [1, 'inHg', 'Pa', 3386.39, 2],
    [1, 'Torr', 'micron', 1000, 9],
    [500, 'micron', 'Torr', 0.5, 10],
    [1, 'BTU_h', 'W', 0.2930711, 7],
    [1, 'kW', 'BTU_h', 3412.142, 3],
    [12000, 'BTU_h', 'kW', 3.51685, 5],
    [1, 'ton', 'BTU_h', 12000, 8],
    [1, 'MBH', 'BTU_h', 1000, 9],
    [1, 'lb', 'kg', 0.45359237, 12],
    [1, 'lb', 'oz', 16, 12],
    [1, 'ft', 'm', 0.3048, 12],
    [1, 'ft', 'in', 12, 12],
    [1, 'ft2', 'm2', 0.09290304, 12],
    [1, 'h', 'min', 60, 12],
    [12.5, 'percent', 'fraction', 0.125, 12],
    [2, 'kW_el', 'W_el', 2000, 12],
  ])('turns %d %s into %s: %d', (value, from, to, expected, digits) => {
    expect(convert(value, from, to)).toBeCloseTo(expected, digits);
  });

  it('gives back exactly what it got when the units are the same', () => {
    expect(convert(0.1 + 0.2, 'degF', 'degF')).toBe(0.1 + 0.2);
  });

  it.each<[UnitId, UnitId]>([
    ['degF', 'degF_diff'],
    ['K_diff', 'K'],
    ['psig', 'psia'],
    ['micron', 'Pa'],
    ['Pa_vac', 'Pa'],
    ['psi_diff', 'psig'],
    ['psia', 'psi_diff'],
    ['Pa_diff', 'Pa_vac'],
    ['W', 'W_el'],
  ])('refuses to turn %s into %s and names both', (from, to) => {
    const attempt = (): number => convert(1, from, to);
    expect(attempt).toThrow(UnitMismatch);
    expect(attempt).toThrow(expect.objectContaining({ from, to }));
  });
});

describe('toSi and fromSi', () => {
  it.each(UNIT_IDS)('are each other’s opposite for %s', (unit) => {
    fc.assert(
      fc.property(fc.double({ min: -1e4, max: 1e4, noNaN: true }), (value) => {
        expect(fromSi(toSi(value, unit), unit)).toBeCloseTo(value, 7);
      }),
    );
  });

  it.each(UNIT_IDS)('keep the order of values for %s', (unit) => {
    fc.assert(
      fc.property(fc.integer({ min: -1e6, max: 1e6 }), (value) => {
        expect(toSi(value + 1, unit)).toBeGreaterThan(toSi(value, unit));
      }),
    );
  });

  // 1 µm of mercury taken as 1/1000 torr; 500 microns is the usual target of an evacuation.
  it.each<Row>([
    [1, 'micron', 'Pa', 0.1333224, 7],
    [500, 'micron', 'Pa', 66.66, 2],
    [500, 'micron', 'psia', 0.009668, 6],
    [500, 'micron', 'inHg', 0.01969, 5],
    [1, 'Torr', 'Pa', 133.3224, 4],
  ])('show a vacuum of %d %s in %s as %d', (value, from, to, expected, digits) => {
    expect(fromSi(toSi(value, from), to)).toBeCloseTo(expected, digits);
  });

  it.each([
    [500, 29.902],
    [2000, 29.843],
  ])('show %d micron at sea level as %d inHg of vacuum', (micron, expected) => {
    expect(fromSi(101325 - toSi(micron, 'micron'), 'inHg')).toBeCloseTo(expected, 2);
  });

  it('turn a density of 1 lb per 1000 ft³ into 16.01846 g/m³', () => {
    const gramsPerCubicMetre = (1000 * toSi(1, 'lb')) / (1000 * toSi(1, 'ft') ** 3);
    expect(gramsPerCubicMetre).toBeCloseTo(16.01846, 5);
  });
});
