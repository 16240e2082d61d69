import { readDate, type CalendarDate } from './calendar-date';

const CLOCK =
  /^(\d{1,4}):(\d{2})(?::(\d{2})(?:[.,](\d{1,9}))?)?(?:\s*([ap])\.?\s?m\.?)?\s*(Z|UTC|GMT|[-+]\d{2}(?::?\d{2})?)?$/i;

/** `ofDay`: less than 24 hours. `elapsed`: any number of hours. `minutes`: two parts are minutes and seconds. */
export type ClockStyle = 'ofDay' | 'elapsed' | 'minutes';

function hourOf(digits: string, half: string | undefined, style: ClockStyle): number {
  const hour = Number(digits);
  if (half === undefined) return style === 'ofDay' && hour > 23 ? NaN : hour;
  if (hour < 1 || hour > 12) return NaN;
  return (hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0);
}

/** How far a zone's clock is ahead of UTC in seconds; zero where none is given. */
function zoneS(zone: string | undefined): number {
  if (zone === undefined || !/^[-+]/.test(zone)) return 0;
  const sign = zone.startsWith('-') ? -1 : 1;
  return sign * (Number(zone.slice(1, 3)) * 3600 + Number(zone.slice(3).replace(':', '') || '0') * 60);
}

/**
 * A clock's time: "14:05", "2:05:30 PM", "14:05:30.25", "14:05:30+02:00", "p. m." as in Spanish.
 *
 * @param text the time alone
 * @param style what the hours may be
 * @returns seconds, less the zone's; NaN when it is no time
 * @source ISO 8601 for the zone and the fraction
 * @example readClock('2:05 PM', 'ofDay') // 50700
 */
export function readClock(text: string, style: ClockStyle): number {
  const parts = CLOCK.exec(text);
  if (parts === null) return NaN;
  const [, first = '', second = '', third, fraction, half, zone] = parts;
  if (style === 'minutes' && third === undefined) return Number(first) * 60 + Number(second);
  const minute = Number(second);
  const seconds = Number(third ?? '0');
  if (minute > 59 || seconds > 59) return NaN;
  const whole = hourOf(first, half, style) * 3600 + minute * 60 + seconds;
  return whole + (fraction === undefined ? 0 : Number(`0.${fraction}`)) - zoneS(zone);
}

const DATES_KEPT = 1000;

/** Reads dates with times. It remembers the dates it has seen: thousands of rows share one. */
export class DateTimes {
  readonly #dates = new Map<string, CalendarDate | undefined>();

  /** A date without a time, or undefined. */
  date(text: string): CalendarDate | undefined {
    if (this.#dates.has(text)) return this.#dates.get(text);
    if (this.#dates.size >= DATES_KEPT) this.#dates.clear();
    const date = readDate(text);
    this.#dates.set(text, date);
    return date;
  }

  /** A date and a time in one cell: after a space, a comma and a space, or ISO 8601's T. */
  dateTime(text: string): CalendarDate | undefined {
    const space = text.indexOf(' ');
    const cut = space === -1 ? text.indexOf('T') : space;
    if (cut < 6) return undefined;
    const dateEnd = text.charCodeAt(cut - 1) === 44 ? cut - 1 : cut;
    return this.together(text.slice(0, dateEnd), text.slice(cut + 1).trim());
  }

  /** A date and a time from two cells. */
  together(dateText: string, clockText: string): CalendarDate | undefined {
    const date = this.date(dateText);
    if (date === undefined) return undefined;
    const clockS = readClock(clockText, 'ofDay');
    if (Number.isNaN(clockS)) return undefined;
    return { monthFirstS: date.monthFirstS + clockS, dayFirstS: date.dayFirstS + clockS };
  }
}
