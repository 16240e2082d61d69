import type { ScheduleReason, ScheduleWord } from '#shared/contracts/schedule-reasons';
import { convert, toSi } from '#shared/units/convert';
import { parseNumber } from '#shared/units/parse-number';
import { parseUnit } from '#shared/units/parse-unit';
import type { Dimension, UnitId } from '#shared/units/unit';
import { readFeetAndInches } from './feet-and-inches';
import { quoted } from './schedule-problems';
import { bare, type Spellings } from './schedule-words';

/** What a cell says, or why it can't be read. */
export type CellReading<V> =
  { readonly ok: true; readonly value: V } | { readonly ok: false; readonly reason: ScheduleReason };

/** What a cell's reader has to know about the file around it. */
export interface CellSurroundings {
  /** Unit of the heading; undefined when the heading has none. */
  readonly unit: UnitId | undefined;
  /** False in a file delimited by commas, which no program writes where the comma is the decimal mark. */
  readonly decimalComma: 'auto' | false;
  /** The designation of the refrigerant that a text names, undefined when it is unknown. */
  readonly knowsRefrigerant: (text: string) => string | undefined;
}

/** Reads the filled cells of one column. */
export interface CellReader<V> {
  readonly read: (cell: string, surroundings: CellSurroundings) => CellReading<V>;
  /** What is measured, where the column carries a unit, and the units to write. */
  readonly measure?: { readonly dimension: Dimension; readonly units: readonly UnitId[] };
}

const refuse = (reason: ScheduleReason): { ok: false; reason: ScheduleReason } => ({ ok: false, reason });

const SPREADSHEET_ERROR = /^#(REF!|N\/A|VALUE!|NAME\?|DIV\/0!|NUM!|NULL!)$/i;

/**
 * Text as it stands, its runs of white space made one space each. What looks like a formula stays text.
 *
 * @param longest number of characters that is still taken
 */
export const text = (longest: number): CellReader<string> => ({
  read: (cell) => {
    if (SPREADSHEET_ERROR.test(cell)) {
      return refuse({ code: 'spreadsheetError', params: { text: quoted(cell) } });
    }
    if (cell.length <= longest) return { ok: true, value: cell };
    return refuse({ code: 'textTooLong', params: { characterCount: cell.length, upTo: longest } });
  },
});

/** A member of a closed set, in any of its usual spellings. */
export function word<Word extends ScheduleWord>(spellings: Spellings<Word>): CellReader<Word> {
  const entries = Object.entries(spellings) as [Word, Spellings<Word>[Word]][];
  const words = new Map(
    entries.flatMap(([value, ways]) => [value, ...ways].map((way) => [bare(way), value] as const)),
  );
  const shown = entries.map(([value, [write]]) => ({ word: value, write }));
  return {
    read: (cell) => {
      const value = words.get(bare(cell));
      return value
        ? { ok: true, value }
        : refuse({ code: 'unknownWord', params: { text: quoted(cell), words: shown } });
    },
  };
}

/** Reads `digits`, which are the cell or the part of it before the unit. */
function readNumber(cell: string, decimalComma: 'auto' | false, digits = cell): CellReading<number> {
  const parsed = parseNumber(digits, { decimalComma });
  if (parsed.ok) return parsed;
  const code = parsed.reason === 'ambiguous' ? 'twoWaysToRead' : 'notANumber';
  return refuse({ code, params: { text: quoted(cell) } });
}

/** A whole number within bounds, both included. */
export const wholeNumber = (low: number, high: number): CellReader<number> => ({
  read: (cell, { decimalComma }) => {
    const number = readNumber(cell, decimalComma);
    if (!number.ok) return number;
    if (Number.isInteger(number.value) && number.value >= low && number.value <= high) return number;
    return refuse({
      code: 'notAWholeNumber',
      params: { text: quoted(cell), lowCount: low, highCount: high },
    });
  },
});

/** Where a number ends and its unit begins: a letter, a degree, per cent, foot or inch sign. */
const UNIT_START = /[\p{L}°º˚∘%'’′"”″]/u;

const bound = (value: number, from: UnitId, to: UnitId): number =>
  Number(convert(value, from, to).toPrecision(3));

/**
 * A quantity with its unit in the heading or in the cell; a unit in both has to be the same one.
 *
 * @param dimension what the column measures
 * @param units to write, the first one that of the bounds
 * @param low smallest plausible value in the first unit
 * @param high largest plausible value in the first unit
 * @returns reader of SI values
 */
export function quantity(
  dimension: Dimension,
  units: readonly [UnitId, ...UnitId[]],
  low: number,
  high: number,
): CellReader<number> {
  const inUnit = (cell: string, value: number, unit: UnitId): CellReading<number> => {
    const si = toSi(value, unit);
    if (si >= toSi(low, units[0]) - 1e-9 && si <= toSi(high, units[0]) + 1e-9) return { ok: true, value: si };
    const range = { low: bound(low, units[0], unit), high: bound(high, units[0], unit), unit };
    return refuse({ code: 'outOfRange', params: { text: quoted(cell), ...range } });
  };
  return {
    measure: { dimension, units },
    read: (cell, { unit, decimalComma }) => {
      const feet = dimension === 'length' ? readFeetAndInches(cell) : undefined;
      if (feet !== undefined) return inUnit(cell, feet, 'ft');
      const start = cell.search(UNIT_START);
      const written = start === -1 ? '' : cell.slice(start);
      const number = readNumber(cell, decimalComma, start === -1 ? cell : cell.slice(0, start));
      if (!number.ok) return number;
      const own = written === '' ? undefined : parseUnit(written, dimension);
      if (written !== '' && !own)
        return refuse({ code: 'unknownUnit', params: { text: quoted(written), units: [...units] } });
      if (own && unit && own !== unit)
        return refuse({ code: 'twoUnits', params: { cell: own, heading: unit } });
      const unitOfValue = own ?? unit;
      if (unitOfValue) return inUnit(cell, number.value, unitOfValue);
      return refuse({ code: 'missingUnit', params: { units: [...units] } });
    },
  };
}

/** A refrigerant that can be judged by, as its designation. */
export const refrigerant: CellReader<string> = {
  read: (cell, { knowsRefrigerant }) => {
    const designation = knowsRefrigerant(cell);
    if (designation !== undefined) return { ok: true, value: designation };
    return refuse({ code: 'unknownRefrigerant', params: { text: quoted(cell) } });
  },
};
