/** Points of a line, in ascending order of time. */
export interface ReducedSamples {
  readonly times: Float64Array;
  readonly values: Float64Array;
}

interface Bucket {
  lowest: number;
  highest: number;
}

/** The lowest and the highest sample's index in each of a number of equal spans of time, the ends left out. */
function bucketsOf(times: Float64Array, values: Float64Array, count: number): Map<number, Bucket> {
  const start = times[0] ?? NaN;
  const span = (times.at(-1) ?? NaN) - start;
  const buckets = new Map<number, Bucket>();
  for (let index = 1; index < times.length - 1; index++) {
    const value = values[index] ?? NaN;
    if (Number.isNaN(value)) continue;
    const place = Math.min(Math.floor((((times[index] ?? NaN) - start) / span) * count), count - 1);
    const bucket = buckets.get(place);
    if (bucket === undefined) buckets.set(place, { lowest: index, highest: index });
    else if (value < (values[bucket.lowest] ?? NaN)) bucket.lowest = index;
    else if (value > (values[bucket.highest] ?? NaN)) bucket.highest = index;
  }
  return buckets;
}

const pick = (from: Float64Array, indexes: readonly number[]): Float64Array =>
  Float64Array.from(indexes, (index) => from[index] ?? NaN);

/**
 * Fewer points of a long log, for a chart or an entry: the first, the last, and the lowest and the highest of each of
 * many equal spans of time. A drawn line looks the same and every extreme survives; the points in between are lost, so
 * a mean, a period or a time above a limit worked out from them is wrong: work those out first.
 *
 * @param times in strictly ascending order, any unit
 * @param values one for each time; those that are no number are left out, except at the ends
 * @param most points wanted; at least 4, and with fewer only the first and the last are kept
 * @returns at most `most` points (2 where `most` is smaller), in ascending order of time; copies of all when they are no
 *   more than that
 * @example reduceSamples(times, values, 500)
 */
export function reduceSamples(times: Float64Array, values: Float64Array, most: number): ReducedSamples {
  const length = Math.min(times.length, values.length);
  if (length <= Math.max(most, 2)) return { times: times.slice(0, length), values: values.slice(0, length) };
  const indexes = [0];
  const count = Math.floor((most - 2) / 2);
  if (count >= 1) {
    const buckets = bucketsOf(times.subarray(0, length), values.subarray(0, length), count);
    for (const { lowest, highest } of buckets.values()) {
      if (lowest === highest) indexes.push(lowest);
      else indexes.push(Math.min(lowest, highest), Math.max(lowest, highest));
    }
  }
  indexes.push(length - 1);
  return { times: pick(times, indexes), values: pick(values, indexes) };
}
