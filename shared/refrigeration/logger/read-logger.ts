import { parseUnit } from '../../units/parse-unit';
import type { UnitId } from '../../units/unit';
import { CELLS_LISTED, ColumnReader, unreadableCell } from './column-reader';
import { decimalMark } from './decimal-mark';
import { cellForm, findRows, type FoundRows } from './find-rows';
import { headingUnit } from './heading-unit';
import type {
  LoggerColumn,
  LoggerProblem,
  LoggerRefusal,
  LoggerResult,
  ReadLoggerOptions,
  UnreadableCell,
} from './logger-file';
import { findGaps, orderRows, pickValues } from './order-rows';
import { splitCells, type Delimiter } from './split-cells';
import { TextLines } from './text-lines';
import { TimeReader } from './time-reader';
import { timeSource } from './time-source';

/** Rows that are read at most: eleven days of one a second. */
export const MOST_ROWS = 1_000_000;
const MOST_COLUMNS = 64;
/** Lines that are looked at to find the table; the metadata above it must be shorter. */
const HEAD_LINES = 500;

/** What is known once the first lines have been looked at, and what comes from the others. */
interface Reading {
  readonly delimiter: Delimiter;
  /** Index of the table's first row among the first lines. */
  readonly firstLine: number;
  readonly time: TimeReader;
  readonly timeHeading: string;
  readonly columns: readonly ColumnReader[];
  readonly columnsLeftOut: number;
  readonly timesUnread: UnreadableCell[];
  timesUnreadCount: number;
  rows: number;
}

const refuse = (reason: LoggerRefusal): LoggerResult => ({ ok: false, reason });

const isUnit = (cell: string): boolean => parseUnit(cell) !== undefined;

function unitsOf(found: FoundRows): (UnitId | null)[] {
  return found.headings.map((heading, index) => {
    const cell = found.unitCells[index]?.trim() ?? '';
    return headingUnit(cell === '' ? heading : `${heading} (${cell.replace(/^[([]|[)\]]$/g, '')})`);
  });
}

/** Prepares the readers from the first lines, or says why the file can't be read. */
function prepare(head: readonly string[], options: ReadLoggerOptions): Reading | LoggerRefusal {
  const found = findRows(head, isUnit);
  if (found === undefined) {
    // A single column of numbers is a table without a time.
    return head.filter((line) => cellForm(line) === 'number').length > 1 ? 'noTimeColumn' : 'tooShort';
  }
  const units = unitsOf(found);
  const source = timeSource(found, units, options);
  if (typeof source === 'string') return source;
  const decimalComma = decimalMark(found.rows, options.decimalComma);
  const timeColumns: readonly number[] = source.columns;
  const columns = found.headings
    .map((heading, index) => new ColumnReader(heading, units[index] ?? null, index, decimalComma))
    .filter(({ index }) => !timeColumns.includes(index));
  return {
    delimiter: found.delimiter,
    firstLine: found.firstLine,
    time: new TimeReader(source, decimalComma),
    timeHeading: found.headings[source.columns[0]] ?? '',
    columns: columns.slice(0, MOST_COLUMNS),
    columnsLeftOut: Math.max(columns.length - MOST_COLUMNS, 0),
    timesUnread: [],
    timesUnreadCount: 0,
    rows: 0,
  };
}

function readRow(reading: Reading, line: string, row: number): void {
  const cells = splitCells(line, reading.delimiter);
  if (!reading.time.read(cells, row)) {
    if (cells.every((cell) => cell.trim() === '')) return;
    reading.timesUnreadCount++;
    if (reading.timesUnread.length < CELLS_LISTED) {
      reading.timesUnread.push(unreadableCell(row, reading.timeHeading, reading.time.textOf(cells)));
    }
    return;
  }
  reading.rows++;
  for (const column of reading.columns) column.read(cells[column.index] ?? '', row);
}

/** What was unreadable or empty in the columns that hold numbers. */
function cellProblems(reading: Reading, columns: readonly ColumnReader[]): LoggerProblem[] {
  const sum = (count: (column: ColumnReader) => number): number =>
    columns.reduce((total, column) => total + count(column), 0);
  const unreadable = reading.timesUnreadCount + sum((column) => column.unreadable);
  const ambiguous = sum((column) => column.ambiguous);
  const empty = sum((column) => column.empty);
  const first = [...reading.timesUnread, ...columns.flatMap((column) => column.firstUnreadable)]
    .sort((a, b) => a.row - b.row)
    .slice(0, CELLS_LISTED);
  const problems: LoggerProblem[] = [];
  if (unreadable > 0) problems.push({ kind: 'unreadableCells', count: unreadable, first });
  if (ambiguous > 0) problems.push({ kind: 'ambiguousNumbers', count: ambiguous });
  if (empty > 0) problems.push({ kind: 'emptyCells', count: empty });
  return problems;
}

function columnProblems(reading: Reading): LoggerProblem[] {
  const problems = reading.columns
    .filter((column) => column.readable === 0)
    .map(({ heading }): LoggerProblem => ({ kind: 'columnWithoutNumbers', heading }));
  const count = reading.columnsLeftOut;
  return count === 0 ? problems : [...problems, { kind: 'columnsLeftOut', count }];
}

function pickColumns(columns: readonly ColumnReader[], picks: Uint32Array): LoggerColumn[] {
  return columns.map(({ heading, unit, values }) => {
    const picked = pickValues(values.view(), picks);
    let readable = 0;
    for (const value of picked) if (!Number.isNaN(value)) readable++;
    return { heading, unit, values: picked, readable };
  });
}

function finish(reading: Reading, options: ReadLoggerOptions): LoggerResult {
  const columns = reading.columns.filter((column) => column.readable > 0);
  const read = reading.time.finish(options.dateOrder ?? 'monthFirst');
  reading.timesUnreadCount += read.unread;
  reading.timesUnread.push(
    ...read.firstUnread.map(({ row, text }) => unreadableCell(row, reading.timeHeading, text)),
  );
  const { picks, problems } = orderRows(read.timesS);
  if (picks.length < 2 || columns.length === 0) return refuse('tooShort');
  const times = pickValues(read.timesS, picks);
  const startS = times[0] ?? NaN;
  for (let index = 0; index < times.length; index++) times[index] = (times[index] ?? NaN) - startS;
  const gaps = findGaps(times);
  return {
    ok: true,
    columns: pickColumns(columns, picks),
    times,
    startText: read.startText,
    rows: times.length,
    problems: [
      ...read.problems,
      ...problems,
      ...(gaps === undefined ? [] : [gaps]),
      ...cellProblems(reading, columns),
      ...columnProblems(reading),
    ],
  };
}

/**
 * Reads a data logger's delimited text: comma, semicolon, tab or bar; decimal comma; metadata above the headings; no
 * headings; units in headings or in a row below them. Times may be ISO 8601, "MM/DD/YYYY hh:mm[:ss] [AM/PM]",
 * "DD.MM.YYYY hh:mm", a date beside a time, "hh:mm:ss", or plain numbers whose heading says seconds, minutes or hours.
 * A clock put back in autumn shows as repeated and unordered times: logs carry no zone.
 *
 * @param text whole, or in pieces of any size such as a file's stream gives
 * @param options what a person said where the file doesn't
 * @returns columns in the units as written, times in seconds from the first row, and what was odd; or why it is refused
 * @range two to 1,000,000 rows (or as told), the first 64 columns, at most 500 lines above the readings
 * @source RFC 4180 for quotes, ISO 8601 for dates; the rest as loggers write, common practice
 * @example readLogger('Time (s),Pressure (psig)\n0,55.2\n10,55.4') // times 0 and 10, one column in psig
 */
export function readLogger(text: string | Iterable<string>, options: ReadLoggerOptions = {}): LoggerResult {
  const lines = new TextLines(text);
  const head: string[] = [];
  for (let line = lines.next(); line !== undefined; line = lines.next()) {
    head.push(line);
    if (head.length === HEAD_LINES) break;
  }
  if (lines.isBinary) return refuse('notText');
  const reading = prepare(head, options);
  if (typeof reading === 'string') return refuse(reading);
  const mostRows = options.mostRows ?? MOST_ROWS;
  for (let index = reading.firstLine; index < head.length; index++) {
    readRow(reading, head[index] ?? '', index + 1);
  }
  for (let line = lines.next(); line !== undefined; line = lines.next()) {
    readRow(reading, line, lines.count);
    if (reading.rows > mostRows) break;
  }
  if (reading.rows > mostRows) return refuse('tooLong');
  return lines.isBinary ? refuse('notText') : finish(reading, options);
}
