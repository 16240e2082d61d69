import { toSi } from '../../units/convert';
import { parseNumber, type ParsedNumber } from '../../units/parse-number';
import { kelvin, pascalAbsolute, pascalGauge, type PascalAbsolute } from '../../units/quantity';
import { UNITS, type UnitId } from '../../units/unit';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from '../gauge-pressure';
import { splitDelimited, type TextRow } from './delimited-text';
import type { MakersPoint } from './makers-table';
import {
  findColumns,
  isGauge,
  type ColumnProblemCode,
  type MakersTableUnits,
  type TableColumns,
} from './table-columns';

/** Why a line can't be read. `row` counts the lines of the text from 1; null when it is about the whole text. */
export interface ReadingProblem {
  readonly code: 'empty' | 'emptyCell' | 'notANumber' | 'ambiguousNumber' | ColumnProblemCode;
  readonly row: number | null;
  /** Position in the line, counted from 1; null when it is about the whole line or text. */
  readonly column: number | null;
  /** The text that is meant, as typed. */
  readonly text: string;
}

export type ReadMakersTable =
  | {
      readonly ok: true;
      readonly points: readonly MakersPoint[];
      /** Line of the text that each point came from, counted from 1. */
      readonly lines: readonly number[];
      /** In which the figures were read: the headings' units before the given ones. */
      readonly units: MakersTableUnits;
      /** Last printed digit of the pressures in pascals. */
      readonly printedStepPa: number;
    }
  | { readonly ok: false; readonly problems: readonly ReadingProblem[] };

type DecimalComma = 'auto' | boolean;

const LEADING_NUMBER = /^[-\u2010-\u2013\u2212\uFE63\uFF0D+]?\s*[\d.,]*\d/;

/** A heading is a line of which no cell begins like a number. */
const isHeading = ({ cells }: TextRow): boolean => !cells.some((cell) => LEADING_NUMBER.test(cell));

/**
 * Whether commas are decimal marks here, told by the figures that can be read in one way only: a comma with other than
 * three digits behind it is one; a lone dot beside commas says the commas group thousands.
 */
function decimalCommaOf(cells: readonly string[], delimiter: string): DecimalComma {
  if (delimiter === ',') return false;
  if (cells.some((cell) => /,(\d{1,2}|\d{4,})$/.test(cell))) return true;
  return cells.some((cell) => /\.\d+$/.test(cell)) ? false : 'auto';
}

function decimalsOf(cell: string, decimalComma: DecimalComma): number {
  const mark = decimalComma === true ? ',' : '.';
  const place = cell.lastIndexOf(mark);
  return place < 0 ? 0 : cell.length - place - 1;
}

function pressureOf(value: number, unit: UnitId): PascalAbsolute {
  if (isGauge(unit)) return toAbsolute(pascalGauge(toSi(value, unit)), SEA_LEVEL_ATMOSPHERE);
  return pascalAbsolute(toSi(value, unit));
}

function cellProblem(
  { row, cells }: TextRow,
  index: number,
  parsed: ParsedNumber & { ok: false },
): ReadingProblem {
  const code =
    parsed.reason === 'empty'
      ? 'emptyCell'
      : parsed.reason === 'ambiguous'
        ? 'ambiguousNumber'
        : 'notANumber';
  return { code, row, column: index + 1, text: cells[index] ?? '' };
}

function readRow(
  row: TextRow,
  columns: TableColumns,
  decimalComma: DecimalComma,
): MakersPoint | ReadingProblem[] {
  const problems: ReadingProblem[] = [];
  const numberAt = (index: number): number => {
    const parsed = parseNumber(row.cells[index] ?? '', { decimalComma });
    if (parsed.ok) return parsed.value;
    problems.push(cellProblem(row, index, parsed));
    return NaN;
  };
  const { units } = columns;
  const temperature = kelvin(toSi(numberAt(columns.temperature), units.temperature));
  const bubble = pressureOf(numberAt(columns.bubble), units.pressure);
  const dew = columns.dew === columns.bubble ? bubble : pressureOf(numberAt(columns.dew), units.pressure);
  return problems.length > 0 ? problems : { temperature, bubble, dew };
}

/** Headings may take two lines, names and units; a line with a single cell is a title. */
function headingsOf(rows: readonly TextRow[]): string[] | null {
  const lines = rows.filter(({ cells }) => cells.filter((cell) => cell !== '').length > 1);
  const [first] = lines;
  if (first === undefined) return null;
  return first.cells.map((_, index) => lines.map(({ cells }) => cells[index] ?? '').join(' '));
}

const refuse = (code: ReadingProblem['code'], row: TextRow | undefined): ReadMakersTable => ({
  ok: false,
  problems: [{ code, row: row?.row ?? null, column: null, text: row?.cells.join(' | ') ?? '' }],
});

/**
 * Reads a maker's table as it is pasted from a sheet or uploaded: tab, semicolon or comma between the columns; a decimal
 * comma wherever the comma isn't the delimiter; titles and headings above the figures in English or Spanish; three columns
 * (temperature, bubble, dew), or two for a pure refrigerant. Gauge pressures become absolute with the standard atmosphere
 * at sea level, for which tables are printed.
 *
 * @param text of the table
 * @param given units to go by where the headings name none
 * @returns points in kelvin and absolute pascals, in the order of the text, or every cell that can't be read; what the
 *   figures are worth is for `checkMakersTable`
 * @example readMakersTable('Temp (°F)\tBubble (psig)\tDew (psig)\n0\t34.3\t23.8', units) // one point at 255.37 K
 */
export function readMakersTable(text: string, given: MakersTableUnits): ReadMakersTable {
  const { delimiter, rows } = splitDelimited(text);
  const firstFigures = rows.findIndex((row) => !isHeading(row));
  if (firstFigures < 0) return refuse('empty', undefined);
  const figures = rows.slice(firstFigures);
  const headings = headingsOf(rows.slice(0, firstFigures));
  const width = Math.max(...figures.map(({ cells }) => cells.length));
  const found = findColumns(headings, width, given);
  if (!found.ok) return refuse(found.reason, rows[firstFigures - 1] ?? figures[0]);
  const { columns } = found;
  const decimalComma = decimalCommaOf(
    figures.flatMap(({ cells }) => cells),
    delimiter,
  );
  const read = figures.map((row) => readRow(row, columns, decimalComma));
  const problems = read.flatMap((row) => ('temperature' in row ? [] : row));
  if (problems.length > 0) return { ok: false, problems };
  const decimals = Math.max(
    ...figures.flatMap(({ cells }) =>
      [columns.bubble, columns.dew].map((index) => decimalsOf(cells[index] ?? '', decimalComma)),
    ),
  );
  return {
    ok: true,
    points: read.flatMap((row) => ('temperature' in row ? [row] : [])),
    lines: figures.map(({ row }) => row),
    units: columns.units,
    printedStepPa: UNITS[columns.units.pressure].factor / 10 ** decimals,
  };
}
