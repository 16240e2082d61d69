import type { CellReading, CellSurroundings } from './cell-readers';
import type { FoundColumn } from './find-columns';
import type { TableRow } from './read-table';
import { SCHEDULE_COLUMNS, type ColumnId, type ColumnValues } from './schedule-columns';
import { quoted, type ScheduleProblems } from './schedule-problems';

/** One line of the schedule with what its cells say. */
export interface ScheduleRow {
  readonly line: number;
  /** Absent: a blank cell, a column that is not there, or a cell in `unreadable`. */
  readonly values: Partial<ColumnValues>;
  /** Columns whose cell can't be read, already named as problems: no default is taken for them. */
  readonly unreadable: ReadonlySet<ColumnId>;
}

/** What the cells' readers have to know; the unit comes with each column. */
export type FileSurroundings = Omit<CellSurroundings, 'unit'>;

// How schedules say that there is nothing to say. Names are never taken for blank.
const NOTHING = /^(?:[-–—]+|n\/?a)$/i;

const isBlank = (cell: string, id: ColumnId): boolean =>
  cell === '' || (!SCHEDULE_COLUMNS[id].isNeeded && NOTHING.test(cell));

/**
 * Reads the cells of every line.
 *
 * @param rows lines below the headings
 * @param columns found by the headings
 * @param width number of headings: cells beyond them mean that a line has shifted
 * @param problems takes every unreadable cell, with its line and heading
 * @returns one row for each line, in the same order
 */
export function readRows(
  rows: readonly TableRow[],
  columns: ReadonlyMap<ColumnId, FoundColumn>,
  width: number,
  surroundings: FileSurroundings,
  problems: ScheduleProblems,
): ScheduleRow[] {
  const withoutUnit = new Set<ColumnId>();

  const readCell = (found: FoundColumn, line: number, cell: string): CellReading<unknown> => {
    const { reader } = SCHEDULE_COLUMNS[found.id];
    const reading: CellReading<unknown> = reader.read(cell, { ...surroundings, unit: found.unit });
    if (reading.ok) return reading;
    // A missing unit is put right in one place, the heading, so it is named once for the whole column.
    const lacksUnit = reading.reason.code === 'missingUnit';
    const isNamed = lacksUnit && (found.hasUnknownUnit || withoutUnit.has(found.id));
    if (!isNamed) problems.add(line, found.heading, reading.reason);
    if (lacksUnit) withoutUnit.add(found.id);
    return reading;
  };

  return rows.map(({ line, cells }) => {
    const values: Partial<Record<ColumnId, unknown>> = {};
    const unreadable = new Set<ColumnId>();
    for (const found of columns.values()) {
      const cell = cells[found.index] ?? '';
      if (isBlank(cell, found.id)) continue;
      const reading = readCell(found, line, cell);
      if (reading.ok) values[found.id] = reading.value;
      else unreadable.add(found.id);
    }
    const stray = cells.slice(width).find((cell) => cell !== '');
    if (stray !== undefined)
      problems.add(line, null, { code: 'beyondLastHeading', params: { text: quoted(stray) } });
    return { line, values: values as Partial<ColumnValues>, unreadable };
  });
}
