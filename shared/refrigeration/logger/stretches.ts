import type { Kelvin, Second } from '../../units/quantity';

/** One temperature of a log. */
export interface TemperatureSample {
  readonly at: Second;
  readonly temperature: Kelvin;
}

export type StretchState = 'inBand' | 'above' | 'below' | 'unknown';

/** A time throughout which the temperature was on one side; seconds of the log's own clock. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly state: StretchState;
}

/** Edges count as within; null is no lower edge. In kelvin. */
export interface TemperatureBand {
  readonly lowK: number | null;
  readonly highK: number;
}

/** Conversion noise of an edge, far too narrow for any instrument. */
const TOLERANCE_K = 1e-9;

function stateOf(temperatureK: number, band: TemperatureBand): StretchState {
  if (temperatureK > band.highK + TOLERANCE_K) return 'above';
  return band.lowK !== null && temperatureK < band.lowK - TOLERANCE_K ? 'below' : 'inBand';
}

/** Where the straight line between two samples crosses an edge, as shares of the way, ascending. */
function crossings(beforeK: number, afterK: number, band: TemperatureBand): number[] {
  const edges = band.lowK === null ? [band.highK] : [band.lowK, band.highK];
  return edges
    .map((edge) => (edge - beforeK) / (afterK - beforeK))
    .filter((share) => share > 0 && share < 1)
    .sort((a, b) => a - b);
}

/** The stretches between two neighbouring samples. */
function between(before: TemperatureSample, after: TemperatureSample, band: TemperatureBand): Stretch[] {
  const shares = [0, ...crossings(before.temperature, after.temperature, band), 1];
  const time = (share: number) => (share === 1 ? after.at : before.at + share * (after.at - before.at));
  return shares.slice(1).map((share, index) => {
    const previous = shares[index] ?? 0;
    const middle = before.temperature + ((previous + share) / 2) * (after.temperature - before.temperature);
    return { from: time(previous), to: time(share), state: stateOf(middle, band) };
  });
}

/**
 * A log cut where it crosses the band's edges, on straight lines between the samples.
 *
 * @param samples in strictly ascending order of time
 * @param band in kelvin
 * @param longestGapS steps longer than this are unknown: nobody saw what happened
 * @returns stretches without a hole between them, neighbours of different states
 */
export function stretchesOf(
  samples: readonly TemperatureSample[],
  band: TemperatureBand,
  longestGapS: number,
): Stretch[] {
  const stretches: Stretch[] = [];
  let before: TemperatureSample | undefined;
  for (const after of samples) {
    if (before !== undefined) {
      const isGap = after.at - before.at > longestGapS;
      const parts: Stretch[] = isGap
        ? [{ from: before.at, to: after.at, state: 'unknown' }]
        : between(before, after, band);
      for (const part of parts) append(stretches, part);
    }
    before = after;
  }
  return stretches;
}

function append(stretches: Stretch[], part: Stretch): void {
  const last = stretches.at(-1);
  if (last?.state === part.state) stretches[stretches.length - 1] = { ...last, to: part.to };
  else stretches.push(part);
}
