import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { buildSchedule } from './build-schedule';
import { checkSchedule } from './check-schedule';
import { findColumns } from './find-columns';
import type { ScheduleReading } from './parsed-schedule';
import { readRows } from './read-rows';
import { readTable } from './read-table';
import { problemOf, ScheduleProblems } from './schedule-problems';
import { ScheduleTree } from './schedule-tree';

const designationOf = (text: string): string | undefined => findRefrigerant(text)?.designation;

/**
 * Reads a designer's refrigeration schedule: a table with one line a fixture, delimited by commas, semicolons or tabs.
 * Cells about a system, suction group or circuit repeat on its lines, or stay blank after its first one. Pure: never
 * throws, whatever the bytes; nothing in a cell is evaluated.
 *
 * @param bytes of the file
 * @param knowsRefrigerant the designation of the refrigerant that a text names, undefined when it is unknown
 * @returns the schedule in SI units, or everything that has to be put right
 */
export function parseSchedule(
  bytes: Uint8Array,
  knowsRefrigerant: (text: string) => string | undefined = designationOf,
): ScheduleReading {
  const table = readTable(bytes);
  if (!table.ok) {
    return {
      ok: false,
      code: table.code,
      problems: [problemOf(table.row, null, table.reason)],
    };
  }
  const { headings, rows, delimiter } = table;
  const problems = new ScheduleProblems();
  const { columns, ignored } = findColumns(headings.cells, headings.line, problems);
  const surroundings = {
    decimalComma: delimiter === ',' ? (false as const) : ('auto' as const),
    knowsRefrigerant,
  };
  const tree = new ScheduleTree(columns, problems);
  for (const row of readRows(rows, columns, headings.cells.length, surroundings, problems)) tree.add(row);
  checkSchedule(tree.systems, columns, problems);
  if (!problems.isEmpty) return { ok: false, code: 'scheduleRefused', problems: problems.list() };
  return { ok: true, schedule: buildSchedule(tree.systems), ignoredColumns: ignored };
}
