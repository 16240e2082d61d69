import { cellNumber, type DecimalComma } from './cell-number';
import { CELLS_LISTED } from './column-reader';
import type { CalendarDate } from './calendar-date';
import { DateTimes, readClock } from './clock-time';
import type { DateOrder, LoggerProblem } from './logger-file';
import { NumberList } from './number-list';
import type { TimeSource } from './time-source';

const HALF_A_DAY_S = 43_200;
const DAY_S = 86_400;

/** Every row's time in seconds from any start; NaN where the order that was taken makes it no date. */
export interface ReadTimes {
  readonly timesS: Float64Array;
  /** The earliest time as written. */
  readonly startText: string;
  readonly problems: readonly LoggerProblem[];
  /** Rows whose date is none in the order that was taken, and the first of them. */
  readonly unread: number;
  readonly firstUnread: readonly RowText[];
}

interface RowText {
  readonly row: number;
  readonly text: string;
}

/** The earliest of the times, with its text. */
class Earliest {
  text = '';
  #atS = Infinity;

  see(atS: number, text: string): void {
    if (!(atS < this.#atS)) return;
    this.#atS = atS;
    this.text = text;
  }
}

/** Reads the time of one row after another. Dates are kept both ways until the last row has had its say. */
export class TimeReader {
  readonly #source: TimeSource;
  readonly #decimalComma: DecimalComma;
  readonly #dates = new DateTimes();
  readonly #monthFirst = new NumberList();
  readonly #dayFirst = new NumberList();
  readonly #earliest = { monthFirst: new Earliest(), dayFirst: new Earliest() };
  readonly #onlyReadable = { monthFirst: 0, dayFirst: 0 };
  readonly #firstOnly: Record<DateOrder, RowText[]> = { monthFirst: [], dayFirst: [] };
  #differ = false;
  #differingBy: number | undefined;
  #changesElapsed = false;
  #days = 0;
  #lastClockS = NaN;
  #midnights = 0;

  constructor(source: TimeSource, decimalComma: DecimalComma) {
    this.#source = source;
    this.#decimalComma = decimalComma;
  }

  /** Takes the row's time; false when there is none to read, and then the row counts for nothing. */
  read(cells: readonly string[], row: number): boolean {
    const text = this.textOf(cells);
    const time = this.#timeOf(cells);
    if (time === undefined) return false;
    const { monthFirstS, dayFirstS } = time;
    this.#monthFirst.push(monthFirstS);
    this.#earliest.monthFirst.see(monthFirstS, text);
    if (!this.#hasDates()) return true;
    this.#dayFirst.push(dayFirstS);
    this.#earliest.dayFirst.see(dayFirstS, text);
    this.#compare(monthFirstS, dayFirstS);
    if (Number.isNaN(dayFirstS)) this.#keepFirst('monthFirst', { row, text });
    if (Number.isNaN(monthFirstS)) this.#keepFirst('dayFirst', { row, text });
    return true;
  }

  /** The row's time as written. */
  textOf(cells: readonly string[]): string {
    return this.#source.columns.map((column) => (cells[column] ?? '').trim()).join(' ');
  }

  finish(told: DateOrder): ReadTimes {
    const problems: LoggerProblem[] = [];
    const order = this.#order() ?? told;
    if (this.#order() === undefined && this.#differ) {
      problems.push({ kind: 'ambiguousDate', taken: order, changesElapsed: this.#changesElapsed });
    }
    if (this.#midnights > 0) problems.push({ kind: 'pastMidnight', count: this.#midnights });
    if (this.#source.kind === 'clock' && this.#source.isGuess) problems.push({ kind: 'hoursAndMinutes' });
    const other = order === 'dayFirst' ? 'monthFirst' : 'dayFirst';
    const isDayFirst = this.#hasDates() && order === 'dayFirst';
    return {
      timesS: (isDayFirst ? this.#dayFirst : this.#monthFirst).view(),
      startText: this.#earliest[isDayFirst ? 'dayFirst' : 'monthFirst'].text,
      problems,
      unread: this.#hasDates() ? this.#onlyReadable[other] : 0,
      firstUnread: this.#firstOnly[other],
    };
  }

  #hasDates(): boolean {
    return this.#source.kind === 'dateTime' || this.#source.kind === 'dateAndClock';
  }

  /** Collects what the dates say about their order. */
  #compare(monthFirstS: number, dayFirstS: number): void {
    const by = dayFirstS - monthFirstS;
    if (Number.isNaN(by)) return;
    if (by !== 0) this.#differ = true;
    // The same shift throughout leaves the times from the first row as they are.
    if (this.#differingBy !== undefined && Math.abs(by - this.#differingBy) > 1) this.#changesElapsed = true;
    this.#differingBy ??= by;
  }

  #keepFirst(only: DateOrder, found: RowText): void {
    this.#onlyReadable[only]++;
    if (this.#firstOnly[only].length < CELLS_LISTED) this.#firstOnly[only].push(found);
  }

  /** The order that the dates themselves show; undefined when all can be read both ways. */
  #order(): DateOrder | undefined {
    const { monthFirst, dayFirst } = this.#onlyReadable;
    if (monthFirst === dayFirst) return undefined;
    return monthFirst > dayFirst ? 'monthFirst' : 'dayFirst';
  }

  #timeOf(cells: readonly string[]): CalendarDate | undefined {
    const source = this.#source;
    const text = (cells[source.columns[0]] ?? '').trim();
    if (source.kind === 'dateTime') return this.#dates.dateTime(text);
    if (source.kind === 'dateAndClock') {
      return this.#dates.together(text, (cells[source.columns[1]] ?? '').trim());
    }
    const seconds = source.kind === 'clock' ? this.#clockOf(text, source) : this.#elapsedOf(text, source);
    return Number.isNaN(seconds) ? undefined : { monthFirstS: seconds, dayFirstS: seconds };
  }

  #elapsedOf(text: string, source: Extract<TimeSource, { kind: 'elapsed' }>): number {
    const number = cellNumber(text, this.#decimalComma);
    return typeof number === 'number' ? number * source.secondsEach : NaN;
  }

  /** A clock without a date: falling back by more than half a day is midnight, and rising so is a row out of order. */
  #clockOf(text: string, source: Extract<TimeSource, { kind: 'clock' }>): number {
    const clockS = readClock(text, source.style);
    if (Number.isNaN(clockS)) return NaN;
    const by = clockS - this.#lastClockS;
    if (by < -HALF_A_DAY_S && this.#lastClockS < DAY_S) {
      this.#days++;
      this.#midnights++;
    } else if (by > HALF_A_DAY_S && this.#days > 0) {
      this.#days--;
    }
    this.#lastClockS = clockS;
    return clockS + this.#days * DAY_S;
  }
}
