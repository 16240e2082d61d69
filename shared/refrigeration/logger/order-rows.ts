import { second, type Second } from '../../units/quantity';
import type { LoggerGap, LoggerProblem } from './logger-file';

/** Which rows to keep, in order of time, and what was wrong with the order they came in. */
export interface OrderedRows {
  /** Indexes of the rows kept. */
  readonly picks: Uint32Array;
  readonly problems: readonly LoggerProblem[];
}

/** Steps longer than this many times the median one are gaps. */
const GAP_FACTOR = 5;
const GAPS_LISTED = 50;

/** Indexes of the rows that have a time, and how many stand after a later one. */
function withTimes(timesS: Float64Array): { readonly rows: Uint32Array; readonly unordered: number } {
  const rows = new Uint32Array(timesS.length);
  let count = 0;
  let unordered = 0;
  let latestS = -Infinity;
  timesS.forEach((timeS, row) => {
    if (Number.isNaN(timeS)) return;
    rows[count++] = row;
    if (timeS < latestS) unordered++;
    else latestS = timeS;
  });
  return { rows: rows.subarray(0, count), unordered };
}

/**
 * Puts rows in order of time. Of rows with the same time the first in the file is kept.
 *
 * @param timesS seconds; a row without a time (NaN) is left out
 * @returns indexes of the rows kept, with strictly ascending times, and how many were repeated or out of order
 */
export function orderRows(timesS: Float64Array): OrderedRows {
  const { rows, unordered } = withTimes(timesS);
  const at = (row: number): number => timesS[row] ?? NaN;
  if (unordered > 0) rows.sort((a, b) => at(a) - at(b) || a - b);
  let kept = 0;
  let lastS = NaN;
  for (const row of rows) {
    if (at(row) === lastS) continue;
    lastS = at(row);
    rows[kept++] = row;
  }
  const problems: LoggerProblem[] = [];
  if (rows.length > kept) problems.push({ kind: 'repeatedTimes', count: rows.length - kept });
  if (unordered > 0) problems.push({ kind: 'unorderedTimes', count: unordered });
  return { picks: rows.subarray(0, kept), problems };
}

/** The picked values in a new array. */
export function pickValues(values: Float64Array, picks: Uint32Array): Float64Array {
  const picked = new Float64Array(picks.length);
  for (let index = 0; index < picks.length; index++) picked[index] = values[picks[index] ?? NaN] ?? NaN;
  return picked;
}

/** The usual distance between two samples. */
function medianStep(timesS: Float64Array): Second {
  const steps = new Float64Array(timesS.length - 1);
  for (let index = 0; index < steps.length; index++) {
    steps[index] = (timesS[index + 1] ?? NaN) - (timesS[index] ?? NaN);
  }
  steps.sort();
  return second(steps[(steps.length - 1) >> 1] ?? NaN);
}

/**
 * Where the logger was silent: steps longer than five times the median one.
 *
 * @param timesS strictly ascending seconds, two or more
 * @returns the problem with the first 50 gaps, or undefined when there are none
 * @source five times: common practice, no publication
 */
export function findGaps(timesS: Float64Array): LoggerProblem | undefined {
  const usual = medianStep(timesS);
  const first: LoggerGap[] = [];
  let count = 0;
  let previousS = timesS[0] ?? NaN;
  for (const timeS of timesS) {
    if (timeS - previousS > GAP_FACTOR * usual) {
      count++;
      if (first.length < GAPS_LISTED) first.push({ from: second(previousS), to: second(timeS) });
    }
    previousS = timeS;
  }
  return count === 0 ? undefined : { kind: 'gaps', count, medianStep: usual, first };
}
