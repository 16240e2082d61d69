import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { roundTo } from './round';

describe('roundTo', () => {
  it.each([
    [1.005, 2, 1.01],
    [1.255, 2, 1.26],
    [8.345, 2, 8.35],
    [-1.005, 2, -1.01],
    [2.5, 0, 3],
    [-2.5, 0, -3],
    [0.05, 1, 0.1],
    [20.94, 1, 20.9],
    [1234, -2, 1200],
    [1.5e-7, 7, 2e-7],
    [1e21, 2, 1e21],
  ])('rounds %d to %d decimals: %d', (value, decimals, expected) => {
    expect(roundTo(value, decimals)).toBe(expected);
  });

  it.each([-0, -0.04, 0])('never gives a negative zero for %d', (value) => {
    expect(Object.is(roundTo(value, 1), 0)).toBe(true);
  });

  it('leaves what is no finite number alone', () => {
    expect(roundTo(NaN, 1)).toBeNaN();
    expect(roundTo(-Infinity, 1)).toBe(-Infinity);
  });

  it('stays within half a unit of the last decimal, and treats signs alike', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 4 }),
        (value, decimals) => {
          expect(Math.abs(roundTo(value, decimals) - value)).toBeLessThanOrEqual(
            0.5 * 10 ** -decimals + 1e-9,
          );
          expect(roundTo(-value, decimals) + roundTo(value, decimals)).toBe(0);
        },
      ),
    );
  });

  it('changes nothing when done twice', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), (value) => {
        expect(roundTo(roundTo(value, 2), 2)).toBe(roundTo(value, 2));
      }),
    );
  });
});
