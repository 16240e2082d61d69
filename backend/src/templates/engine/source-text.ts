import type { FailurePlace } from '#shared/failures/failure';

/** Something wrong in a source, at a character offset from its beginning. */
export interface Problem {
  readonly offset: number;
  readonly sentence: string;
}

/** More of a long line than this is not shown around a place. */
const SHOWN_BEFORE = 60;
const SHOWN_WIDTH = 120;

/** A template as written, able to say where in it something stands. */
export class SourceText {
  readonly #lineStarts: number[] = [0];

  constructor(
    readonly fileName: string,
    readonly text: string,
  ) {
    for (let at = text.indexOf('\n'); at !== -1; at = text.indexOf('\n', at + 1))
      this.#lineStarts.push(at + 1);
  }

  /** Line and column of an offset, both counted from 1; an offset outside the text is moved to its nearest end. */
  lineAndColumn(offset: number): { line: number; column: number } {
    const inside = Math.min(Math.max(offset, 0), this.text.length);
    let low = 0;
    let high = this.#lineStarts.length - 1;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((this.#lineStarts[middle] ?? 0) <= inside) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: inside - (this.#lineStarts[low] ?? 0) + 1 };
  }

  /** A problem as a place that a person finds: `file:line:column`, the sentence, the line and a caret under it. */
  placeOf(problem: Problem): FailurePlace {
    const { line, column } = this.lineAndColumn(problem.offset);
    const start = this.#lineStarts[line - 1] ?? 0;
    const end = this.text.indexOf('\n', start);
    const whole = this.text.slice(start, end === -1 ? undefined : end).replace(/\r$/, '');
    const from = Math.max(0, column - 1 - SHOWN_BEFORE);
    const shown = whole.slice(from, from + SHOWN_WIDTH);
    // Tabs stay tabs before the caret, so that it stands under its character however wide a tab is shown.
    const indent = shown.slice(0, column - 1 - from).replace(/[^\t]/g, ' ');
    return {
      path: `${this.fileName}:${line}:${column}`,
      message: `${problem.sentence}\n${shown}\n${indent}^`,
    };
  }
}
