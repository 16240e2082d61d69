import { describe, expect, it } from '@jest/globals';
import { second } from '../units/quantity';
import { fahrenheitDifference, inFahrenheitDifference } from './readings.fixture';
import { timeWeightedMean, type SuperheatSample } from './time-weighted-mean';

const trend = (...points: (readonly [seconds: number, degF: number])[]): SuperheatSample[] =>
  points.map(([seconds, degF]) => ({ at: second(seconds), superheat: fahrenheitDifference(degF) }));

describe('timeWeightedMean', () => {
  // Worked by hand: straight lines between the samples. The middles of high and low would be 8 and 9 °F.
  it.each([
    [trend([0, 2], [20, 2], [80, 14], [90, 14], [140, 2]), 7.571],
    [trend([0, 3], [90, 3], [100, 15], [120, 15], [140, 3]), 6.0],
    [trend([10, -4], [20, -2]), -3],
  ])('counts each value as long as it lasts (case %#)', (samples, expected) => {
    const mean = timeWeightedMean(samples);
    expect(mean === undefined ? NaN : inFahrenheitDifference(mean)).toBeCloseTo(expected, 3);
  });

  it.each([
    ['no sample', trend()],
    ['one sample', trend([0, 5])],
    ['time standing still', trend([5, 2], [5, 4])],
    ['time running backwards', trend([0, 2], [20, 2], [10, 4])],
    ['a superheat that is no number', trend([0, NaN], [5, 4])],
    ['a time that is no number', trend([0, 2], [NaN, 4])],
  ])('gives nothing for %s', (_, samples) => {
    expect(timeWeightedMean(samples)).toBeUndefined();
  });

  it('does not change its input', () => {
    const samples = trend([0, 2], [20, 4]);
    const copy = structuredClone(samples);
    timeWeightedMean(samples);
    expect(samples).toEqual(copy);
  });
});
