import type { Language } from '#shared/checklist/text';

const DAY_MS = 86_400_000;

/** The Spanish read here is North American: decimal point, AM and PM. */
export const LOCALES: Readonly<Record<Language, string>> = { en: 'en-US', es: 'es-US' };

/**
 * A calendar day (`2026-12-01`) in words. It has no time zone: it is the same day for every reader.
 *
 * @returns such as "1 Dec 2026"; the text itself when it is no date
 */
export function formatDay(day: string, language: Language): string {
  const date = new Date(`${day.slice(0, 10)}T00:00:00Z`);
  if (Number.isNaN(date.getTime())) return day;
  return new Intl.DateTimeFormat(LOCALES[language], { dateStyle: 'medium', timeZone: 'UTC' }).format(date);
}

/**
 * A moment on the store's own clock, which it names; on the reader's own where the store's isn't known.
 *
 * @param timeZone IANA name; the reader's own where it is not known or not a zone
 * @returns such as "Dec 1, 2026, 7:15 AM MST"; the text itself when it is no moment
 */
export function formatMoment(moment: string, language: Language, timeZone?: string): string {
  const date = new Date(moment);
  if (Number.isNaN(date.getTime())) return moment;
  const style = {
    year: 'numeric',
    month: 'short',
    day: 'numeric',
    hour: 'numeric',
    minute: '2-digit',
  } as const;
  const zone = timeZone ? ({ timeZone, timeZoneName: 'short' } as const) : {};
  try {
    return new Intl.DateTimeFormat(LOCALES[language], { ...style, ...zone }).format(date);
  } catch (error) {
    // A zone that this browser doesn't know throws RangeError; the reader's own zone is better than no time.
    if (error instanceof RangeError) {
      return new Intl.DateTimeFormat(LOCALES[language], style).format(date);
    }
    throw error;
  }
}

/** The calendar day that it is at a moment in a time zone, as `2026-12-01`. */
export function dayOf(moment: Date, timeZone?: string): string {
  const parts = { year: 'numeric', month: '2-digit', day: '2-digit' } as const;
  return new Intl.DateTimeFormat('en-CA', { ...parts, ...(timeZone ? { timeZone } : {}) }).format(moment);
}

/**
 * Whole days from one calendar day to another.
 *
 * @returns negative when `to` lies before `from`; NaN when either is no date
 */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / DAY_MS);
}
