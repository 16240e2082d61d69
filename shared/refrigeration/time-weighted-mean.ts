import { kelvinDifference, type KelvinDifference, type Second } from '../units/quantity';

/** One superheat of a trend, and when it was read, counted from any start. */
export interface SuperheatSample {
  readonly at: Second;
  readonly superheat: KelvinDifference;
}

/**
 * The mean of a trend, each value counted as long as it lasted, with straight lines between the samples.
 *
 * @param samples in ascending order of time, seconds and kelvin; two or more
 * @returns mean in kelvin, or undefined when there are fewer than two samples, time stands still or runs backwards, or
 *   anything is no number
 * @source trapezium rule
 * @example timeWeightedMean([0 s: 2 K, 20 s: 2 K, 80 s: 14 K]) // 6.5 K
 */
export function timeWeightedMean(samples: readonly SuperheatSample[]): KelvinDifference | undefined {
  let area = 0;
  let duration = 0;
  let previous: SuperheatSample | undefined;
  for (const sample of samples) {
    if (previous !== undefined) {
      const step = sample.at - previous.at;
      if (step < 0) return undefined;
      area += (step * (previous.superheat + sample.superheat)) / 2;
      duration += step;
    }
    previous = sample;
  }
  const mean = area / duration;
  return Number.isFinite(mean) ? kelvinDifference(mean) : undefined;
}
