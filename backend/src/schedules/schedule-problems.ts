import type { ScheduleProblem } from '#shared/contracts/schedules';

/** As many as anybody reads; the rest is counted. */
export const MOST_PROBLEMS = 200;

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
   * @param reason one sentence that says what to do
   */
  add(row: number, column: string | null, reason: string): void {
    this.all.push({ row, column, reason });
  }

  /** @returns the problems in the order of the file; over `MOST_PROBLEMS`, a last one says how many more there are */
  list(): ScheduleProblem[] {
    const sorted = this.all.toSorted((a, b) => a.row - b.row);
    const next = sorted[MOST_PROBLEMS];
    if (!next) return sorted;
    const left = sorted.length - MOST_PROBLEMS;
    const reason = `${left} more ${left === 1 ? 'problem follows' : 'problems follow'}; put right those listed and import again.`;
    return [...sorted.slice(0, MOST_PROBLEMS), { row: next.row, column: null, reason }];
  }
}

/** @returns "a", "a or b", "a, b or c" */
export const either = (words: readonly string[]): string =>
  [words.slice(0, -1).join(', '), ...words.slice(-1)].filter((text) => text !== '').join(' or ');

const LONGEST_QUOTE = 40;

/** @returns what the file says, in quotation marks, cut so that a sentence stays readable */
export const quote = (text: string): string =>
  `"${text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE)}…` : text}"`;
