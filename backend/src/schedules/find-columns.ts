import { parseUnit } from '#shared/units/parse-unit';
import type { UnitId } from '#shared/units/unit';
import { COLUMN_IDS, isNeededColumn, SCHEDULE_COLUMNS, type ColumnId } from './schedule-columns';
import { quoted, type ScheduleProblems } from './schedule-problems';
import { bare } from './schedule-words';

/** Where a column stands in the file. */
export interface FoundColumn {
  readonly id: ColumnId;
  readonly index: number;
  /** As written in the file. */
  readonly heading: string;
  readonly unit: UnitId | undefined;
  /** Whether the heading has a unit that can't be read, which is named there and not again in each cell. */
  readonly hasUnknownUnit: boolean;
}

/** A heading that names a column; `unitText` is what stands where the unit belongs. */
interface RecognisedHeading {
  readonly id: ColumnId;
  readonly unitText: string;
}

const IDS_BY_NAME: ReadonlyMap<string, ColumnId> = new Map(
  COLUMN_IDS.flatMap((id) => {
    const { label, spellings } = SCHEDULE_COLUMNS[id];
    return [id, label, ...spellings].map((heading) => [bare(heading), id] as const);
  }),
);

const measureOf = (id: ColumnId) => SCHEDULE_COLUMNS[id].reader.measure;

/**
 * The column that a heading names: by its name, with a unit in brackets, or with a unit as its last word or two.
 *
 * @param heading as written, white space made single
 * @returns undefined when it names none
 */
export function recogniseHeading(heading: string): RecognisedHeading | undefined {
  if (heading === '') return undefined;
  const bracketed = /^([^([]*)[([]([^()[\]]*)[)\]]\s*$/.exec(heading);
  const inBrackets = bracketed && IDS_BY_NAME.get(bare(bracketed[1] ?? ''));
  if (inBrackets) return { id: inBrackets, unitText: bracketed[2]?.trim() ?? '' };
  const whole = IDS_BY_NAME.get(bare(heading));
  if (whole) return { id: whole, unitText: '' };
  const words = heading.split(/[\s,_;:]+/);
  for (const count of [1, 2]) {
    const id = IDS_BY_NAME.get(bare(words.slice(0, -count).join(' ')));
    const dimension = id && measureOf(id)?.dimension;
    const unitText = words.slice(-count).join(' ');
    if (id && dimension && parseUnit(unitText, dimension)) return { id, unitText };
  }
  return undefined;
}

/** @returns how many cells name a column: what tells the line of headings, and the right delimiter */
export const countHeadings = (cells: readonly string[]): number =>
  cells.filter((cell) => recogniseHeading(cell) !== undefined).length;

function unitOf(
  recognised: RecognisedHeading,
  row: number,
  heading: string,
  problems: ScheduleProblems,
): Pick<FoundColumn, 'unit' | 'hasUnknownUnit'> {
  const measure = measureOf(recognised.id);
  if (!measure || recognised.unitText === '') return { unit: undefined, hasUnknownUnit: false };
  const unit = parseUnit(recognised.unitText, measure.dimension);
  if (!unit) {
    const params = { text: quoted(recognised.unitText), units: [...measure.units] };
    problems.add(row, heading, { code: 'unknownUnit', params });
  }
  return { unit, hasUnknownUnit: unit === undefined };
}

/** Headings listed where one is missing; a file that is no schedule can have thousands. */
const MOST_LISTED = 40;

const listed = (headings: readonly string[]): { found: string[]; moreCount: number } => ({
  found: headings.slice(0, MOST_LISTED).map(quoted),
  moreCount: Math.max(0, headings.length - MOST_LISTED),
});

/**
 * Finds the columns of a schedule by the headings.
 *
 * @param headings cells of the line of headings
 * @param row that line's number
 * @param problems takes a needed column that is missing, one that is there twice, and an unknown unit
 * @returns the columns by id, and the headings that name none
 */
export function findColumns(
  headings: readonly string[],
  row: number,
  problems: ScheduleProblems,
): { columns: ReadonlyMap<ColumnId, FoundColumn>; ignored: readonly string[] } {
  const columns = new Map<ColumnId, FoundColumn>();
  const ignored: string[] = [];
  headings.forEach((heading, index) => {
    const recognised = recogniseHeading(heading);
    if (!recognised) {
      if (heading !== '') ignored.push(heading);
      return;
    }
    const other = columns.get(recognised.id);
    if (other) {
      problems.add(row, heading, { code: 'sameColumn', params: { other: quoted(other.heading) } });
      return;
    }
    columns.set(recognised.id, {
      id: recognised.id,
      index,
      heading,
      ...unitOf(recognised, row, heading, problems),
    });
  });
  const found = listed(headings.filter((heading) => heading !== ''));
  for (const id of COLUMN_IDS) {
    if (!isNeededColumn(id) || columns.has(id)) continue;
    const params = { column: id, heading: SCHEDULE_COLUMNS[id].label, ...found };
    problems.add(row, null, { code: 'missingColumn', params });
  }
  return { columns, ignored };
}
