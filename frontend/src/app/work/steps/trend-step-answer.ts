import { MOST_SAMPLES, type TrendAnswer, type TrendStep } from '#shared/checklist/kinds/trend';
import { physicalDoubt } from '#shared/checklist/physical-range';
import { reduceSamples } from '#shared/refrigeration/logger/reduce-samples';
import { roundTo } from '#shared/units/round';
import type { PickedLog } from '../logger/log-choice';

/** What was done to a log so that it fits into an entry; nothing to most. */
export interface Fitting {
  /** Only the lowest and the highest of each of many short spans are kept. */
  readonly isReduced: boolean;
  /** Only the end of a log of weeks is kept. */
  readonly isCut: boolean;
}
export const WHOLE: Fitting = { isReduced: false, isCut: false };

/**
 * A log that has to be reduced is cut to so many days. Reduced, neighbours lie up to two spans apart; over fifteen days that is
 * 865 s, which still counts as seen (`LONGEST_GAP`). Whether a log ends in a hold is seen in its last days.
 */
const MOST_DAYS = 15;
const DAY_S = 86_400;
const LONGEST_TEXT = { column: 120, startText: 60 };
/** Conversion noise: far too narrow for any instrument. */
const TOLERANCE_K = 1e-9;

interface Samples {
  readonly times: Float64Array;
  readonly values: Float64Array;
}

/** Loggers write figures such as −999 where a probe was missing: what no instrument shows is no reading. */
const isTemperature = (value: number): boolean => physicalDoubt('temperature', value) === null;

const readable = ({ times, values }: Samples): Samples => ({
  times: times.filter((_, index) => isTemperature(values[index] ?? NaN)),
  values: values.filter(isTemperature),
});

function lastDays({ times, values }: Samples): Samples {
  const fromS = (times.at(-1) ?? NaN) - MOST_DAYS * DAY_S;
  // Rows far apart need no reducing: then as many as there is room for.
  const first = Math.min(
    times.findIndex((time) => time >= fromS),
    times.length - MOST_SAMPLES,
  );
  return { times: times.subarray(first), values: values.subarray(first) };
}

function fit(all: Samples): { readonly samples: Samples; readonly fitting: Fitting } {
  if (all.times.length <= MOST_SAMPLES) return { samples: all, fitting: WHOLE };
  const last = lastDays(all);
  return {
    samples: reduceSamples(last.times, last.values, MOST_SAMPLES),
    fitting: {
      isReduced: last.times.length > MOST_SAMPLES,
      isCut: last.times.length < all.times.length,
    },
  };
}

/**
 * A temperature to 0.01 K that stays on its side of the band's edges: 39 °F is 277.0389 K, and rounded up it would lie
 * above a limit of 39 °F.
 */
function rounded(temperatureK: number, { bandLowK, bandHighK }: TrendStep): number {
  const value = roundTo(temperatureK, 2);
  const isUpTo = (edge: number, one: number): boolean => one <= edge + TOLERANCE_K;
  const isFrom = (edge: number, one: number): boolean => one >= edge - TOLERANCE_K;
  if (isUpTo(bandHighK, temperatureK) !== isUpTo(bandHighK, value)) {
    return roundTo(value + (value > temperatureK ? -0.01 : 0.01), 2);
  }
  if (bandLowK !== null && isFrom(bandLowK, temperatureK) !== isFrom(bandLowK, value)) {
    return roundTo(value + (value > temperatureK ? -0.01 : 0.01), 2);
  }
  return value;
}

/**
 * The answer that a picked log gives: times to 0.1 s, temperatures to 0.01 K, rows without a temperature left out, and no
 * more samples than an entry holds.
 *
 * @param log with the temperature as its only column
 */
export function trendAnswerOf(
  log: PickedLog,
  step: TrendStep,
): { readonly answer: TrendAnswer; readonly fitting: Fitting } {
  const [column] = log.columns;
  const { samples, fitting } = fit(
    readable({ times: log.times, values: column?.values ?? new Float64Array() }),
  );
  return {
    answer: {
      kind: 'trend',
      file: log.file,
      startText: log.startText.slice(0, LONGEST_TEXT.startText),
      column: (column?.heading ?? '').slice(0, LONGEST_TEXT.column),
      atS: Array.from(samples.times, (time) => roundTo(time, 1)),
      temperatureK: Array.from(samples.values, (value) => rounded(value, step)),
    },
    fitting,
  };
}

/** Dates that can be read in one way only: year first, or a day beyond the twelfth after the month. */
const CLEAR_DATE = /^(\d{4}-\d\d-\d\d|\d{1,2}\/(1[3-9]|2\d|3[01])\/\d{4})\b/;
/** Clocks of loggers and phones are an hour apart after a change of summer time. */
const CLOCK_ROOM_MS = 2 * 3_600_000;

/**
 * Whether a log ends later than now, as with a file of another year or a logger whose clock is wrong.
 *
 * @returns `false` where its dates can't be read for sure
 */
export function endsInFuture({ startText, atS }: TrendAnswer, nowMs: number): boolean {
  if (!CLEAR_DATE.test(startText)) return false;
  const endMs = Date.parse(startText.replace(/^(\d{4}-\d\d-\d\d) /, '$1T')) + 1000 * (atS.at(-1) ?? 0);
  return Number.isFinite(endMs) && endMs > nowMs + CLOCK_ROOM_MS;
}
