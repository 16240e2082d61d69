import {
  addDifference,
  kelvin,
  kelvinDifference,
  subtractTemperatures,
  type Kelvin,
  type Second,
} from '../../units/quantity';
import { timeWeightedMean } from '../time-weighted-mean';
import type { TemperatureSample } from './stretches';

export interface TemperatureRange {
  readonly minimum: Kelvin;
  readonly maximum: Kelvin;
  /** Time-weighted. */
  readonly mean: Kelvin;
}

/** The samples from a moment on, beginning with the straight line's value at that moment. */
function from(samples: readonly TemperatureSample[], start: Second): TemperatureSample[] {
  const index = samples.findIndex(({ at }) => at >= start);
  const after = samples[index];
  const before = samples[index - 1];
  if (after === undefined) return [];
  if (after.at === start || before === undefined) return samples.slice(index);
  const share = (start - before.at) / (after.at - before.at);
  const temperature = kelvin(before.temperature + share * (after.temperature - before.temperature));
  return [{ at: start, temperature }, ...samples.slice(index)];
}

/** Cut where a step is too long to say anything about. */
function runsOf(samples: readonly TemperatureSample[], longestGap: Second): TemperatureSample[][] {
  const runs: TemperatureSample[][] = [];
  let previous: TemperatureSample | undefined;
  for (const sample of samples) {
    const run = runs.at(-1);
    if (run === undefined || previous === undefined || sample.at - previous.at > longestGap) {
      runs.push([sample]);
    } else {
      run.push(sample);
    }
    previous = sample;
  }
  return runs;
}

/** The mean over the runs, each counted as long as it lasted. */
function meanOf(runs: readonly TemperatureSample[][], base: Kelvin): Kelvin {
  let area = 0;
  let duration = 0;
  for (const run of runs) {
    const lasted = (run.at(-1)?.at ?? NaN) - (run[0]?.at ?? NaN);
    // A mean of differences from one temperature, because temperatures themselves don't add up.
    const mean = timeWeightedMean(
      run.map(({ at, temperature }) => ({ at, superheat: subtractTemperatures(temperature, base) })),
    );
    if (mean === undefined) continue;
    area += mean * lasted;
    duration += lasted;
  }
  return addDifference(base, kelvinDifference(area / duration));
}

/**
 * Minimum, maximum and time-weighted mean from a moment on; what lies in a gap of the log counts for nothing.
 *
 * @param samples in strictly ascending order of time, all numbers
 * @param start seconds, within the log
 * @param longestGap a longer step is a gap
 * @returns kelvin; null when nothing with a duration follows
 */
export function rangeAfter(
  samples: readonly TemperatureSample[],
  start: Second,
  longestGap: Second,
): TemperatureRange | null {
  const rest = from(samples, start);
  const base = rest[0]?.temperature;
  if (base === undefined) return null;
  let minimum = Infinity;
  let maximum = -Infinity;
  for (const { temperature } of rest) {
    minimum = Math.min(minimum, temperature);
    maximum = Math.max(maximum, temperature);
  }
  const mean = meanOf(runsOf(rest, longestGap), base);
  if (!Number.isFinite(mean)) return null;
  return { minimum: kelvin(minimum), maximum: kelvin(maximum), mean };
}
