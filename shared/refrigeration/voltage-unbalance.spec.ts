import { describe, expect, it } from '@jest/globals';
import { volt } from '../units/quantity';
import { voltageUnbalance } from './voltage-unbalance';

describe('voltageUnbalance', () => {
  // NEMA MG 1 definition; worked examples of public pages, the second without its early rounding.
  it.each([
    [460, 467, 450, 1.96],
    [220, 216, 213, 1.69],
    [462, 463, 455, 1.09],
    [208, 208, 208, 0],
  ])('of %d, %d and %d V is %d %', (a, b, c, percent) => {
    expect((voltageUnbalance([volt(a), volt(b), volt(c)]) ?? NaN) * 100).toBeCloseTo(percent, 2);
  });

  it.each([0, -208, NaN, Infinity])('gives nothing when a voltage is %d', (voltage) => {
    expect(voltageUnbalance([volt(208), volt(voltage), volt(208)])).toBeUndefined();
  });
});
