/** Length of the day in seconds. Clocks of defrost controls know no daylight saving and no leap second. */
export const DAY_S = 86_400;

/**
 * How long after `fromS` the clock shows `toS` for the first time: the day is a circle, so 23:50 to 00:10 is 20 minutes.
 *
 * @param fromS second of the day
 * @param toS second of the day
 * @returns seconds, at least 0 and less than a day; NaN when either is no number
 * @example secondsUntil(85_800, 600) // 1200
 */
export function secondsUntil(fromS: number, toS: number): number {
  const difference = (toS - fromS) % DAY_S;
  return difference < 0 ? difference + DAY_S : difference;
}

/**
 * The shorter way round the clock between two moments.
 *
 * @param firstS second of the day
 * @param secondS second of the day
 * @returns seconds, at least 0 and at most half a day; NaN when either is no number
 * @example secondsApart(85_800, 600) // 1200
 */
export const secondsApart = (firstS: number, secondS: number): number =>
  Math.min(secondsUntil(firstS, secondS), secondsUntil(secondS, firstS));

/**
 * Whether a span that begins at `startS` lasts at `atS`. The start belongs to it, the end doesn't.
 *
 * @param startS second of the day
 * @param lengthS seconds
 * @param atS second of the day
 * @returns true when it does
 * @example lasts(85_800, 1200, 0) // true
 */
export const lasts = (startS: number, lengthS: number, atS: number): boolean =>
  secondsUntil(startS, atS) < lengthS;

/**
 * Whether two spans share a moment. One that ends as the other begins doesn't; a span without length shares none.
 *
 * @param first start as second of the day, length in seconds
 * @param second likewise
 * @returns true when they do
 * @example overlap({ startS: 85_800, lengthS: 1200 }, { startS: 0, lengthS: 60 }) // true
 */
export const overlap = (first: Span, second: Span): boolean =>
  first.lengthS > 0 &&
  second.lengthS > 0 &&
  (lasts(first.startS, first.lengthS, second.startS) || lasts(second.startS, second.lengthS, first.startS));

/** A part of the day that may run past midnight. */
export interface Span {
  readonly startS: number;
  readonly lengthS: number;
}
