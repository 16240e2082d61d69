import { describe, expect, it } from '@jest/globals';
import { kelvinDifference } from '../units/quantity';
import { fahrenheitDifference, inFahrenheitDifference } from './readings.fixture';
import { huntingMean } from './hunting-mean';

describe('huntingMean', () => {
  it.each([
    [14, 2, 8],
    [15, 3, 9],
    [6, -2, 2],
    [1, -5, -2],
  ])('of %d and %d °F is %d °F', (high, low, expected) => {
    const mean = huntingMean(fahrenheitDifference(high), fahrenheitDifference(low));
    expect(inFahrenheitDifference(mean)).toBeCloseTo(expected, 9);
  });

  it('is NaN when one of the two is', () => {
    expect(huntingMean(kelvinDifference(NaN), kelvinDifference(2))).toBeNaN();
  });
});
