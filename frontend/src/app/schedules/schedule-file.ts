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

/** One problem as it is shown, its reason in the language that is read. */
export interface SaidProblem {
  readonly row: number;
  readonly column: string | null;
  readonly reason: string;
}

/** The problems whose row, column or reason contains what was typed. */
export function findProblems(rows: readonly SaidProblem[], text: string): readonly SaidProblem[] {
  const wanted = text.trim().toLowerCase();
  if (wanted === '') return rows;
  return rows.filter(({ row, column, reason }) =>
    `${row} ${column ?? ''} ${reason}`.toLowerCase().includes(wanted),
  );
}
