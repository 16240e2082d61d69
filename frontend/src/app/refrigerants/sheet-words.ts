import type { Language } from '#shared/checklist/text';
import { FEWEST_POINTS, WIDEST_GAP_K } from '#shared/refrigeration/makers-table/makers-table';
import type { MakersTableProblem } from '#shared/refrigeration/makers-table/makers-table';
import type { ReadingProblem } from '#shared/refrigeration/makers-table/read-makers-table';
import type { MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import { formatNumber, formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { differenceUnit, pressureInWords } from './sheet-units';

type Parameters = Readonly<Record<string, string | number>>;

/** Translates one key with its parameters into the language that is read. */
export type Say = (key: string, parameters?: Parameters) => string;

/** One finding as it is shown: the line of the text it is about, and a sentence. */
export interface SaidProblem {
  /** Tells it from the others of the same reading. */
  readonly id: string;
  readonly line: number | null;
  readonly sentence: string;
}

/** What the sentences about a sheet are told with. */
export interface SheetScene {
  readonly units: MakersTableUnits;
  readonly lines: readonly number[];
  readonly isPure: boolean;
  readonly language: Language;
}

type Value = MakersTableProblem['values'][number];

function valueInWords({ value, unit }: Value, { units, language }: SheetScene): string {
  switch (UNITS[unit].dimension) {
    case 'temperature':
      return formatQuantity(value, units.temperature, language);
    case 'temperatureDifference':
      return formatQuantity(value, differenceUnit(units.temperature), language);
    case 'absolutePressure':
      return pressureInWords(value, units.pressure, language);
    default:
      return formatNumber(value, unit === 'count' ? 0 : 1, language);
  }
}

function columnKey(problem: MakersTableProblem, scene: SheetScene): string {
  return `refrigerants.column_${scene.isPure ? 'one' : (problem.column ?? 'both')}`;
}

/** A row that its neighbours contradict in one pressure, in both, or in the only one of a pure refrigerant. */
function sentenceKey({ code, column }: MakersTableProblem, { isPure }: SheetScene): string {
  const key = `refrigerants.problem_${code}`;
  return code === 'outlyingPoint' && column === 'both' && !isPure ? `${key}Both` : key;
}

/** The pressure that an outlying row has, and the one that its neighbours expect there. */
function outlyingParameters({ values }: MakersTableProblem, scene: SheetScene): Parameters {
  const [found, expected] = values;
  return {
    ...(found ? { found: valueInWords(found, scene) } : {}),
    ...(expected ? { expected: valueInWords(expected, scene) } : {}),
  };
}

/** @returns what is wrong or odd about a sheet, as a sentence that says what to look at */
export function problemInWords(problem: MakersTableProblem, scene: SheetScene, say: Say): SaidProblem {
  const { code, row, column, values } = problem;
  const widest = { label: 'widest', value: WIDEST_GAP_K, unit: 'K_diff' } as const;
  const parameters = {
    column: say(columnKey(problem, scene)),
    fewest: FEWEST_POINTS,
    widest: valueInWords(widest, scene),
    ...Object.fromEntries(values.map((value) => [value.label, valueInWords(value, scene)])),
    ...(code === 'outlyingPoint' ? outlyingParameters(problem, scene) : {}),
    ...(code === 'notPositive' && values[0] ? { pressure: valueInWords(values[0], scene) } : {}),
  };
  return {
    id: `${code} ${row ?? ''} ${column ?? ''}`,
    line: row === null ? null : (scene.lines[row - 1] ?? null),
    sentence: say(sentenceKey(problem, scene), parameters),
  };
}

/** @returns why a line can't be read, as a sentence */
export function readingInWords({ code, row, column, text }: ReadingProblem, say: Say): SaidProblem {
  return {
    id: `${code} ${row ?? ''} ${column ?? ''}`,
    line: row,
    sentence: say(`refrigerants.reading_${code}`, { text: text, column: column ?? '' }),
  };
}
