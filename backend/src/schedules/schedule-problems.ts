import type { ScheduleReason } from '#shared/contracts/schedule-reasons';
import type { ScheduleProblem } from '#shared/contracts/schedules';
import { sentenceOf } from './schedule-sentences';

/** As many as anybody reads; the rest is counted. */
export const MOST_PROBLEMS = 200;

/**
 * @param row physical line of the file
 * @param column heading as written in the file, null when it is about the whole line or the file
 * @returns the problem, its reason also as a sentence
 */
export const problemOf = (row: number, column: string | null, reason: ScheduleReason): ScheduleProblem => ({
  row,
  column,
  reason,
  message: sentenceOf(reason),
});

/** Collects everything that is wrong with a schedule, so that it is put right in one go. */
export class ScheduleProblems {
  private readonly all: ScheduleProblem[] = [];

  /** Whether nothing is wrong so far. */
  get isEmpty(): boolean {
    return this.all.length === 0;
  }

  /**
   * @param row physical line of the file
   * @param column heading as written in the file, null when it is about the whole line or the file
   * @param reason why, and what it is about
   */
  add(row: number, column: string | null, reason: ScheduleReason): void {
    this.all.push(problemOf(row, column, reason));
  }

  /** @returns the problems in the order of the file; over `MOST_PROBLEMS`, a last one says how many more there are */
  list(): ScheduleProblem[] {
    const sorted = this.all.toSorted((a, b) => a.row - b.row);
    const next = sorted[MOST_PROBLEMS];
    if (!next) return sorted;
    const count = sorted.length - MOST_PROBLEMS;
    const rest = problemOf(next.row, null, { code: 'moreProblems', params: { count } });
    return [...sorted.slice(0, MOST_PROBLEMS), rest];
  }
}

const LONGEST_QUOTE = 40;

/** @returns what the file says, cut so that a sentence that quotes it stays readable */
export const quoted = (text: string): string =>
  text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE)}…` : text;
