import type { Second } from '../../units/quantity';
import type { UnitId } from '../../units/unit';

/** Which number of "05/06/2026" is the month. */
export type DateOrder = 'monthFirst' | 'dayFirst';

/** What a person can say about a file where the file itself doesn't. */
export interface ReadLoggerOptions {
  /** How to read a date that can be read both ways throughout the file; `monthFirst` unless told. */
  readonly dateOrder?: DateOrder;
  /** Whether the comma of "1,234" is the decimal mark; such cells stay unread where neither this nor the file says so. */
  readonly decimalComma?: boolean;
  /** Of a column of plain numbers that is the time; only asked for where its heading names no unit. */
  readonly elapsedUnit?: 's' | 'min' | 'h';
  /** Rows that are read at most; a million unless told. */
  readonly mostRows?: number;
}

/** One column of readings. */
export interface LoggerColumn {
  /** As written; empty in a file without headings. */
  readonly heading: string;
  /** As the heading names it; null where it names none. Values stay in this unit. */
  readonly unit: UnitId | null;
  /** One for each of the file's times, NaN where the cell was empty or unreadable. */
  readonly values: Float64Array;
  /** How many of the values are numbers. */
  readonly readable: number;
}

/** A cell that says nothing that can be used. */
export interface UnreadableCell {
  /** The file's line, from 1. */
  readonly row: number;
  readonly heading: string;
  /** As written, shortened to 40 characters. */
  readonly text: string;
}

/** A stretch without samples, in seconds from the first row. */
export interface LoggerGap {
  readonly from: Second;
  readonly to: Second;
}

/**
 * What a reader of the file should know. `pastMidnight`: a clock without dates fell back by more than half a day, so
 * a day was added. `hoursAndMinutes`: a clock like "05:30" without heading or date was taken as hours and minutes.
 * `ambiguousNumbers` are among the unreadable cells.
 */
export type LoggerProblem =
  | { readonly kind: 'ambiguousDate'; readonly taken: DateOrder; readonly changesElapsed: boolean }
  | { readonly kind: 'repeatedTimes'; readonly count: number }
  | { readonly kind: 'unorderedTimes'; readonly count: number }
  | {
      readonly kind: 'gaps';
      readonly count: number;
      readonly medianStep: Second;
      /** The first 50. */
      readonly first: readonly LoggerGap[];
    }
  | { readonly kind: 'unreadableCells'; readonly count: number; readonly first: readonly UnreadableCell[] }
  | { readonly kind: 'ambiguousNumbers'; readonly count: number }
  | { readonly kind: 'emptyCells'; readonly count: number }
  | { readonly kind: 'pastMidnight'; readonly count: number }
  | { readonly kind: 'hoursAndMinutes' }
  | { readonly kind: 'columnWithoutNumbers'; readonly heading: string }
  | { readonly kind: 'columnsLeftOut'; readonly count: number };

/** A logger's file as columns of numbers, in order of time. */
export interface LoggerFile {
  readonly ok: true;
  /** Without the time and without columns that hold no number. */
  readonly columns: readonly LoggerColumn[];
  /** Seconds from the first row, strictly ascending. */
  readonly times: Float64Array;
  /** The first time as written. */
  readonly startText: string;
  /** How many rows were kept: the length of `times` and of each column. */
  readonly rows: number;
  readonly problems: readonly LoggerProblem[];
}

/**
 * `noTimeUnit`: a column of plain numbers may be the time, but nothing says whether they are seconds or minutes; ask and
 * read again with `elapsedUnit`.
 */
export type LoggerRefusal = 'notText' | 'tooShort' | 'tooLong' | 'noTimeColumn' | 'noTimeUnit';

export type LoggerResult = LoggerFile | { readonly ok: false; readonly reason: LoggerRefusal };
