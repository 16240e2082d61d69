import * as z from 'zod/mini';
import { scheduleProblemSchema, type ScheduleProblem } from '#shared/contracts/schedules';
import { problemOf } from '../ui/problem-of';

export const MOST_BYTES = 5 * 1024 * 1024;

/** What keeps a file from being sent at all; the server checks the rest. `null`: nothing does. */
export function fileFault(file: {
  readonly name: string;
  readonly size: number;
}): 'tooLarge' | 'empty' | 'notCsv' | null {
  if (file.size === 0) return 'empty';
  if (file.size > MOST_BYTES) return 'tooLarge';
  return /\.(csv|txt|tsv)$/i.test(file.name) ? null : 'notCsv';
}

/** The rows that a refused schedule names; empty when the refusal names none. */
export function refusedRows(error: unknown): readonly ScheduleProblem[] {
  const rows = z.array(scheduleProblemSchema).safeParse(problemOf(error)?.facts['rows']);
  return rows.success ? rows.data : [];
}

/** The problems whose row, column or reason contains what was typed. */
export function findProblems(rows: readonly ScheduleProblem[], text: string): readonly ScheduleProblem[] {
  const wanted = text.trim().toLowerCase();
  if (wanted === '') return rows;
  return rows.filter(({ row, column, reason }) =>
    `${row} ${column ?? ''} ${reason}`.toLowerCase().includes(wanted),
  );
}

/** How the server's sentence about a missing column goes on. */
const HEADINGS = / The headings found are: (.+)\.$/;

/**
 * Several missing columns each name all headings that the file has: those are said once.
 *
 * @returns `headings` is null where at most one problem names them, which then keeps its sentence whole
 */
export function sayHeadingsOnce(rows: readonly ScheduleProblem[]): {
  readonly rows: readonly ScheduleProblem[];
  readonly headings: string | null;
} {
  const named = rows.flatMap(({ reason }) => HEADINGS.exec(reason)?.[1] ?? []);
  const [headings] = named;
  if (headings === undefined || named.length < 2) return { rows, headings: null };
  return { rows: rows.map((row) => ({ ...row, reason: row.reason.replace(HEADINGS, '') })), headings };
}
