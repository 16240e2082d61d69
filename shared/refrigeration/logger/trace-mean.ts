import { kelvinDifference, second, type KelvinDifference, type Second } from '../../units/quantity';
import { timeWeightedMean, type SuperheatSample } from '../time-weighted-mean';

/** The superheat at a moment within the trace, on the straight line between its neighbours. */
function sampleAt(samples: readonly SuperheatSample[], at: number): SuperheatSample | undefined {
  const index = samples.findIndex((sample) => sample.at >= at);
  const after = samples[index];
  const before = samples[index - 1];
  if (after === undefined || after.at === at || before === undefined) return after;
  const share = (at - before.at) / (after.at - before.at);
  const value = before.superheat + share * (after.superheat - before.superheat);
  return { at: second(at), superheat: kelvinDifference(value) };
}

/**
 * The time-weighted mean of a part of a trace, with straight lines to its ends.
 *
 * @param samples in ascending order of time
 * @param from seconds, within the trace
 * @param to seconds, within the trace
 * @returns mean in kelvin, or undefined when the part has no duration
 * @source trapezium rule
 * @example meanBetween([0 s: 2 K, 10 s: 4 K], second(0), second(5)) // 2.5 K
 */
export function meanBetween(
  samples: readonly SuperheatSample[],
  from: Second,
  to: Second,
): KelvinDifference | undefined {
  const ends = [sampleAt(samples, from), sampleAt(samples, to)] as const;
  if (ends[0] === undefined || ends[1] === undefined) return undefined;
  const within = samples.filter(({ at }) => at > from && at < to);
  return timeWeightedMean([ends[0], ...within, ends[1]]);
}
