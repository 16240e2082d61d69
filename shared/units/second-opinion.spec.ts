import { describe, expect, it } from '@jest/globals';
import fc from 'fast-check';
import { unit as mathUnit } from 'mathjs';
import { convert } from './convert';
import type { UnitId } from './unit';

/**
 * The same units as another library writes them (mathjs, which has its factors from its own sources). Differences of
 * temperature, gauge pressures, microns and inches of mercury have no unit there; they share their factors with units that do.
 */
const SECOND: readonly (readonly [UnitId, UnitId, string, string])[] = [
  ['degC', 'degF', 'degC', 'degF'],
  ['degC', 'K', 'degC', 'K'],
  ['degF', 'K', 'degF', 'K'],
  ['psia', 'kPaa', 'psi', 'kPa'],
  ['bara', 'psia', 'bar', 'psi'],
  ['Torr', 'Pa_vac', 'torr', 'Pa'],
  ['psi_diff', 'kPa_diff', 'psi', 'kPa'],
  ['ft', 'm', 'ft', 'm'],
  ['in', 'm', 'in', 'm'],
  ['ft2', 'm2', 'sqft', 'm^2'],
  ['BTU_h', 'W', 'BTU/hour', 'W'],
  ['lb', 'kg', 'lbm', 'kg'],
  ['oz', 'kg', 'oz', 'kg'],
  ['min', 's', 'minute', 's'],
  ['h', 's', 'hour', 's'],
  ['kW', 'W', 'kW', 'W'],
];

describe('convert, against a library that has its factors from elsewhere', () => {
  it.each(SECOND)('%s to %s', (from, to, theirFrom, theirTo) => {
    fc.assert(
      fc.property(fc.double({ min: -400, max: 4000, noNaN: true }), (value) => {
        const theirs = mathUnit(value, theirFrom).toNumber(theirTo);
        const ours = convert(value, from, to);
        // Their torr and BTU are rounded in the sixth digit.
        expect(Math.abs(ours - theirs)).toBeLessThanOrEqual(5e-6 * Math.max(1, Math.abs(theirs)));
      }),
    );
  });
});
