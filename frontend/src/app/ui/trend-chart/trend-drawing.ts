import { reduceSamples } from '#shared/refrigeration/logger/reduce-samples';
import { fromSi, toSi } from '#shared/units/convert';
import type { UnitId } from '#shared/units/unit';

export interface TrendSamples {
  /** Seconds, ascending. */
  readonly atS: readonly number[];
  readonly temperatureK: readonly number[];
}

export interface TrendBand {
  readonly lowK: number | null;
  readonly highK: number;
}

/** A tick of an axis: its place from 0 (left, top) to 1, and its value in the axis' unit. */
export interface Tick {
  readonly at: number;
  readonly value: number;
}

export interface TrendDrawing {
  /** In a square of 1000 by 1000, broken where the log is silent. */
  readonly path: string;
  /** From top to bottom, 0 to 1. */
  readonly band: { readonly from: number; readonly to: number; readonly hasLow: boolean };
  readonly hours: readonly Tick[];
  readonly degrees: readonly Tick[];
  /** Where a moment in seconds lies between left and right. */
  readonly placeOf: (atS: number) => number;
  readonly lowestK: number;
  readonly highestK: number;
}

/** More points than this are finer than a laptop's pixels. */
const MOST_POINTS = 1600;
const SQUARE = 1000;
const HOUR_S = 3600;
const HOUR_STEPS = [0.05, 0.1, 0.25, 0.5, 1, 2, 3, 6, 12, 24, 48, 72, 120, 240];
const DEGREE_STEPS = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100];
const MOST_TICKS = 6;
/** Of the height, above and below the line. */
const MARGIN = 0.08;
/** The least that the axis of temperatures spans, so that an instrument's flutter doesn't look like a swing. */
const LEAST_SPAN_K = 4;

interface Range {
  readonly low: number;
  readonly high: number;
}

/** Not `Math.min(...values)`: thousands of arguments overflow the stack. */
const rangeOf = (values: readonly number[]): Range =>
  values.reduce<Range>(
    ({ low, high }, value) => ({ low: Math.min(low, value), high: Math.max(high, value) }),
    { low: Infinity, high: -Infinity },
  );

function ticksBetween({ low, high }: Range, steps: readonly number[]): number[] {
  const step = steps.find((one) => (high - low) / one <= MOST_TICKS) ?? (high - low) / MOST_TICKS;
  const first = Math.ceil(low / step - 1e-9);
  const count = Math.floor(high / step + 1e-9) - first + 1;
  return Array.from({ length: Math.max(count, 0) }, (_, index) =>
    Number(((first + index) * step).toFixed(6)),
  );
}

function shownRange(data: Range, band: TrendBand): Range {
  const low = Math.min(data.low, band.lowK ?? band.highK);
  const high = Math.max(data.high, band.highK);
  const missing = Math.max(LEAST_SPAN_K - (high - low), 0) / 2;
  const margin = (high - low + 2 * missing) * MARGIN + missing;
  return { low: low - margin, high: high + margin };
}

/** The first index whose time is later; the length when none is. */
function indexAfter(atS: readonly number[], time: number): number {
  let low = 0;
  let high = atS.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((atS[middle] ?? Infinity) <= time) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Whether the whole log is silent somewhere between two of the moments that are drawn. */
function isSilentBetween(atS: readonly number[], fromS: number, toS: number, longestGapS: number): boolean {
  if (toS - fromS <= longestGapS) return false;
  for (let index = indexAfter(atS, fromS); index < atS.length; index++) {
    const before = atS[index - 1] ?? fromS;
    if (before >= toS) return false;
    if ((atS[index] ?? before) - before > longestGapS) return true;
  }
  return false;
}

function pathOf(
  { atS, temperatureK }: TrendSamples,
  longestGapS: number,
  place: (atS: number, temperatureK: number) => string,
): string {
  const { times, values } = reduceSamples(
    Float64Array.from(atS),
    Float64Array.from(temperatureK),
    MOST_POINTS,
  );
  let path = '';
  let before = NaN;
  times.forEach((time, index) => {
    const isBroken = index === 0 || isSilentBetween(atS, before, time, longestGapS);
    path += `${isBroken ? 'M' : 'L'}${place(time, values[index] ?? NaN)}`;
    before = time;
  });
  return path;
}

/**
 * A log as a line over hours with its band as a channel.
 *
 * @param unit in which temperatures are read
 * @param longestGapS a longer step between two samples is silence and breaks the line
 * @returns `null` for fewer than two samples, or times that don't ascend
 */
export function drawTrend(
  samples: TrendSamples,
  band: TrendBand,
  unit: UnitId,
  longestGapS: number,
): TrendDrawing | null {
  const [fromS, toS] = [samples.atS[0] ?? NaN, samples.atS.at(-1) ?? NaN];
  if (!(toS > fromS)) return null;
  const data = rangeOf(samples.temperatureK);
  const shown = shownRange(data, band);
  const placeOf = (atS: number): number => (atS - fromS) / (toS - fromS);
  const depthOf = (temperatureK: number): number => (shown.high - temperatureK) / (shown.high - shown.low);
  const inSquare = (share: number): string => (share * SQUARE).toFixed(1);
  const degrees = { low: fromSi(shown.low, unit), high: fromSi(shown.high, unit) };
  return {
    path: pathOf(
      samples,
      longestGapS,
      (atS, kelvins) => `${inSquare(placeOf(atS))} ${inSquare(depthOf(kelvins))}`,
    ),
    band: {
      from: depthOf(band.highK),
      to: band.lowK === null ? 1 : depthOf(band.lowK),
      hasLow: band.lowK !== null,
    },
    hours: ticksBetween({ low: fromS / HOUR_S, high: toS / HOUR_S }, HOUR_STEPS).map((value) => ({
      value,
      at: placeOf(value * HOUR_S),
    })),
    degrees: ticksBetween(degrees, DEGREE_STEPS).map((value) => ({ value, at: depthOf(toSi(value, unit)) })),
    placeOf,
    lowestK: data.low,
    highestK: data.high,
  };
}
