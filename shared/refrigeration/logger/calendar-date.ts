const SECONDS_A_DAY = 86_400;

/** One date as seconds since 1970 both ways; NaN where it can't be read so. The two are equal where it is certain. */
export interface CalendarDate {
  readonly monthFirstS: number;
  readonly dayFirstS: number;
}

const DATE = /^(\d{1,4})([-/.])(\d{1,2})\2(\d{1,4})$/;

/** Midnight of a day as seconds since 1970, leaving time zones out; NaN for a day that no calendar has. */
function midnight(year: number, month: number, day: number): number {
  const milliseconds = Date.UTC(year, month - 1, day);
  const date = new Date(milliseconds);
  const exists = date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
  return exists ? (milliseconds / 86_400_000) * SECONDS_A_DAY : NaN;
}

/** The year from its digits, or NaN; two digits are of this century, since no logger kept files in the last. */
const yearOf = (digits: string): number => {
  if (digits.length === 4) return Number(digits);
  return digits.length === 2 ? 2000 + Number(digits) : NaN;
};

/**
 * A date: "2026-05-06", "2026/05/06", "06.05.2026" (day first, as with dots everywhere), and "05/06/2026" or
 * "05-06-2026", which say nothing about the order.
 *
 * @param text the date alone
 * @returns both readings in seconds since 1970, or undefined when it is no date in either
 * @source ISO 8601 for the first; common practice for the others
 * @example readDate('05/06/2026') // monthFirstS: 6 May, dayFirstS: 5 June
 */
export function readDate(text: string): CalendarDate | undefined {
  const parts = DATE.exec(text);
  if (parts === null) return undefined;
  const [, first = '', separator = '', second = '', third = ''] = parts;
  const both = (seconds: number) => ({ monthFirstS: seconds, dayFirstS: seconds });
  if (first.length === 4) {
    const certain = midnight(Number(first), Number(second), Number(third));
    return Number.isNaN(certain) ? undefined : both(certain);
  }
  const year = yearOf(third);
  const dayFirstS = midnight(year, Number(second), Number(first));
  const monthFirstS = separator === '.' ? dayFirstS : midnight(year, Number(first), Number(second));
  return Number.isNaN(dayFirstS) && Number.isNaN(monthFirstS) ? undefined : { monthFirstS, dayFirstS };
}
