import { cellNumber } from './cell-number';
import { DateTimes, readClock } from './clock-time';
import { splitCells, type Delimiter } from './split-cells';

/** What one cell looks like by itself. */
export type CellForm = 'number' | 'dateTime' | 'date' | 'clock' | 'empty' | 'words';

/** Where the table begins in a file's first lines, and what its rows are split by. */
export interface FoundRows {
  readonly delimiter: Delimiter;
  /** Cells of the first lines, from the table's first row on. */
  readonly rows: readonly (readonly string[])[];
  /** Index of the first row among the lines. */
  readonly firstLine: number;
  readonly headings: readonly string[];
  /** Cells of a row of units below the headings; empty when there is none. */
  readonly unitCells: readonly string[];
}

// In the order of preference where two explain a file equally well: a comma may be a decimal mark, a tab nothing else.
const DELIMITERS: readonly Delimiter[] = ['\t', ';', '|', ','];

const dates = new DateTimes();

/** What a cell looks like; a comma as decimal mark counts as well as a dot. */
export function cellForm(text: string): CellForm {
  const trimmed = text.trim();
  const number = cellNumber(trimmed, 'auto');
  if (number === 'empty') return 'empty';
  if (number !== 'unreadable') return 'number';
  if (dates.dateTime(trimmed) !== undefined) return 'dateTime';
  if (dates.date(trimmed) !== undefined) return 'date';
  return Number.isNaN(readClock(trimmed, 'elapsed')) ? 'words' : 'clock';
}

interface Shape {
  readonly cells: readonly string[];
  readonly readable: number;
  readonly words: number;
}

function shapeOf(line: string, delimiter: Delimiter): Shape {
  const cells = splitCells(line, delimiter);
  let readable = 0;
  let words = 0;
  for (const cell of cells) {
    const form = cellForm(cell);
    if (form === 'words') words++;
    else if (form !== 'empty') readable++;
  }
  return { cells, readable, words };
}

/** A row of readings: a time and a value at least, and no more words than those. */
const isRow = (shape: Shape): boolean => shape.readable >= 2 && shape.readable >= shape.words;

/** The commonest number of cells among the rows, and how well this delimiter explains them. */
function weigh(shapes: readonly Shape[]): { readonly width: number; readonly score: number } {
  const scores = new Map<number, number>();
  for (const shape of shapes) {
    if (!isRow(shape)) continue;
    const width = shape.cells.length;
    scores.set(width, (scores.get(width) ?? 0) + shape.readable - shape.words);
  }
  let best = { width: 0, score: -1 };
  for (const [width, score] of scores) if (score > best.score) best = { width, score };
  return best;
}

/** A line above the first row that belongs to the table: as wide as its rows, give or take a trailing delimiter. */
const isAsWide = (shape: Shape, width: number): boolean =>
  Math.abs(shape.cells.length - width) <= 1 && shape.cells.length > 1;

const isBlank = (shape: Shape): boolean => shape.readable === 0 && shape.words === 0;

/** Whether a row's first cell is a word and the next row's is none: headings that are channel numbers, "Time,101,102". */
function isHeadingOfNumbers(shape: Shape | undefined, next: Shape | undefined): shape is Shape {
  const isWord = (one: Shape | undefined) => one !== undefined && cellForm(one.cells[0] ?? '') === 'words';
  return next !== undefined && isRow(next) && isWord(shape) && !isWord(next);
}

/** Indexes of up to two lines of headings above the first row, nearest first, and the row from which readings count. */
function aboveFirstRow(shapes: readonly Shape[], first: number, width: number) {
  const own = shapes[first];
  if (isHeadingOfNumbers(own, shapes[first + 1])) return { firstLine: first + 1, headings: [own] };
  let firstLine = first;
  const headings: Shape[] = [];
  for (let index = first - 1; index >= 0 && headings.length < 2; index--) {
    const shape = shapes[index];
    if (shape === undefined || isBlank(shape)) continue;
    if (!isAsWide(shape, width)) break;
    if (shape.readable > 0 && headings.length > 0) break;
    // A row whose values are missing, such as "0,---", is still a row.
    if (shape.readable > 0) firstLine = index;
    else headings.push(shape);
  }
  return { firstLine, headings };
}

/**
 * Finds the table in a file's first lines: below any metadata, with or without headings.
 *
 * @param lines the first lines, blank ones included
 * @param isUnit whether a cell says a unit and nothing else
 * @returns the delimiter, headings (all empty texts when there are none) and rows; undefined when no line looks like a
 *   row of readings
 */
export function findRows(lines: readonly string[], isUnit: (cell: string) => boolean): FoundRows | undefined {
  let best: { delimiter: Delimiter; shapes: Shape[]; width: number; score: number } | undefined;
  for (const delimiter of DELIMITERS) {
    const shapes = lines.map((line) => shapeOf(line, delimiter));
    const weighed = weigh(shapes);
    if (weighed.width > 0 && weighed.score > (best?.score ?? -1)) best = { delimiter, shapes, ...weighed };
  }
  if (best === undefined) return undefined;
  const { delimiter, shapes, width } = best;
  const first = shapes.findIndex((shape) => isRow(shape) && shape.cells.length === width);
  const { firstLine, headings } = aboveFirstRow(shapes, first, width);
  const [nearest, above] = headings.map((shape) => shape.cells);
  const isUnitRow = nearest?.every((cell) => cell.trim() === '' || isUnit(cell)) === true;
  const named = isUnitRow && above !== undefined ? above : nearest;
  return {
    delimiter,
    rows: shapes.slice(firstLine).map((shape) => shape.cells),
    firstLine,
    headings: Array.from({ length: width }, (_, index) => named?.[index]?.trim() ?? ''),
    unitCells: named === above && isUnitRow ? (nearest ?? []) : [],
  };
}
