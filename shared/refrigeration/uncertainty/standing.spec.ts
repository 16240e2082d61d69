import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { kelvinDifference } from '../../units/quantity';
import { fahrenheitDifference } from '../readings.fixture';
import { judgeSuperheat } from '../superheat-band';
import { standingOf } from './standing';

const BAND = { low: fahrenheitDifference(3), high: fahrenheitDifference(5) };
const standing = (value: number, uncertainty: number) =>
  standingOf(fahrenheitDifference(value), BAND, fahrenheitDifference(uncertainty));

describe('standingOf', () => {
  it.each([
    [4, 0.5, 'inside'],
    [4, 1, 'inside'],
    [4.1, 1.6, 'insideWithinError'],
    [3, 0, 'inside'],
    [3, 0.1, 'insideWithinError'],
    [5, 0, 'inside'],
    [5.5, 0.4, 'outside'],
    [5.5, 0.5, 'outsideWithinError'],
    [2.5, 1.6, 'outsideWithinError'],
    [0.5, 1.6, 'outside'],
    [12, 1.6, 'outside'],
  ])('%d ± %d °F on 3 to 5 °F is %s', (value, uncertainty, expected) => {
    expect(standing(value, uncertainty)).toBe(expected);
  });

  it.each([0, -0.5])('never explains %d °F away', (value) => {
    expect(standing(value, 10)).toBe('outside');
  });

  it('passes nothing that is no number', () => {
    expect(standing(NaN, 1)).toBe('outside');
    expect(standing(4, NaN)).toBe('outside');
    expect(standing(4, -1)).toBe('outside');
    const swapped = { low: BAND.high, high: BAND.low };
    expect(standingOf(fahrenheitDifference(4), swapped, kelvinDifference(9))).toBe('outside');
  });

  it('stands on the side that the judgement says, and only the error of the edge softens it', () => {
    const numbers = fc.double({ min: 0.01, max: 20, noNaN: true });
    fc.assert(
      fc.property(numbers, numbers, (value, error) => {
        const found = standingOf(kelvinDifference(value), BAND, kelvinDifference(error));
        const { outcome } = judgeSuperheat(kelvinDifference(value), BAND);
        expect(found.startsWith('inside')).toBe(outcome === 'within');
        const toNearestEdge = Math.min(Math.abs(value - BAND.low), Math.abs(value - BAND.high));
        if (Math.abs(toNearestEdge - error) > 1e-6)
          expect(found.endsWith('WithinError')).toBe(toNearestEdge < error);
      }),
    );
  });
});
