import type { MakersTableFacts } from '#shared/checklist/facts';
import { makersTableOf } from '#shared/checklist/saturation-of';
import { newRefrigerantTableSchema } from '#shared/contracts/refrigerants';
import { buildMakersTable } from '#shared/refrigeration/makers-table/build-makers-table';
import { checkMakersTable } from '#shared/refrigeration/makers-table/check-makers-table';
import type { MakersTableProblem } from '#shared/refrigeration/makers-table/makers-table';
import { readMakersTable, type ReadingProblem } from '#shared/refrigeration/makers-table/read-makers-table';
import type { MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import { usualDesignation } from '#shared/refrigeration/saturation/designation';
import { REFRIGERANTS } from '#shared/refrigeration/saturation/refrigerants';
import type { SaturationTable } from '#shared/refrigeration/saturation/saturation-table';

/** Whose sheet it is, as typed. */
export interface SheetNames {
  readonly designation: string;
  readonly issuer: string;
  readonly edition: string;
}

/** A sheet without its safety class, which no figure tells: it is chosen beside them. */
export type SheetTable = Omit<MakersTableFacts, 'safetyClass'>;

/** More rows than any printed sheet has; the contract has the same limit. */
export const MOST_ROWS = 400;

/** What the typed figures come to. */
export type SheetReading =
  | { readonly kind: 'empty' }
  | { readonly kind: 'unreadable'; readonly problems: readonly ReadingProblem[] }
  | { readonly kind: 'tooManyRows'; readonly rowCount: number }
  | SheetFigures;

export interface SheetFigures {
  readonly kind: 'figures';
  readonly table: SheetTable;
  /** Line of the text that each row came from. */
  readonly lines: readonly number[];
  readonly units: MakersTableUnits;
  readonly problems: readonly MakersTableProblem[];
  /** What results are worked out with; null while something is refused. */
  readonly saturation: SaturationTable | null;
}

/** Findings that stand at the fields of the names, not among the figures. */
export const NAME_CODES: ReadonlySet<MakersTableProblem['code']> = new Set(['noDesignation', 'noIssuer']);

/** Of a pure refrigerant both columns are the same one: what is said of both is said once. */
function withoutRepetition(problems: readonly MakersTableProblem[], isPure: boolean): MakersTableProblem[] {
  if (!isPure) return [...problems];
  const same = (one: MakersTableProblem) => `${one.code} ${one.row ?? ''}`;
  return problems.filter((one, index) => problems.findIndex((other) => same(other) === same(one)) === index);
}

/** Whether a sheet has one pressure a row. */
export const isPure = ({ points }: Pick<MakersTableFacts, 'points'>): boolean =>
  points.every(({ bubblePa, dewPa }) => bubblePa === dewPa);

/** Reads and checks a sheet as it stands in the form. */
export function readSheet(text: string, given: MakersTableUnits, names: SheetNames): SheetReading {
  if (text.trim() === '') return { kind: 'empty' };
  const read = readMakersTable(text, given);
  if (!read.ok) return { kind: 'unreadable', problems: read.problems };
  if (read.points.length > MOST_ROWS) return { kind: 'tooManyRows', rowCount: read.points.length };
  const table: SheetTable = {
    designation: usualDesignation(names.designation),
    issuer: names.issuer.trim(),
    edition: names.edition.trim(),
    printedStepPa: read.printedStepPa,
    points: read.points.map(({ temperature, bubble, dew }) => ({
      temperatureK: temperature,
      bubblePa: bubble,
      dewPa: dew,
    })),
  };
  const problems = checkMakersTable(makersTableOf(table), [...REFRIGERANTS.values()]);
  return {
    kind: 'figures',
    table,
    lines: read.lines,
    units: read.units,
    problems: withoutRepetition(problems, isPure(table)),
    saturation: saturationOf(table),
  };
}

/** The curve is worth seeing before the sheet's names are typed. */
function saturationOf(table: SheetTable): SaturationTable | null {
  const { designation, issuer } = table;
  const named = { ...table, designation: designation || '–', issuer: issuer || '–' };
  const built = buildMakersTable(makersTableOf(named));
  return built.ok ? built.table : null;
}

/** Whether a schedule could name the refrigerant so. */
export const isDesignation = (text: string): boolean =>
  newRefrigerantTableSchema.shape.designation.safeParse(usualDesignation(text)).success;
