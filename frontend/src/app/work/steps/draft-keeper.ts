import { Injectable } from '@angular/core';
import type { SequenceId } from '#shared/plant/ids';

const FORMAT = 1;
const keyOf = (sequenceId: SequenceId, stepKey: string): string =>
  `firstcold.draft.${FORMAT}.${sequenceId}.${stepKey}`;

/**
 * What was typed on a step and isn't recorded yet, kept in this browser: an as-found reading must survive the quarter
 * of an hour that a valve takes to settle, and a phone that closes the page meanwhile.
 */
@Injectable({ providedIn: 'root' })
export class DraftKeeper {
  /** @returns `null` when nothing was typed, or it can't be read */
  read(sequenceId: SequenceId, stepKey: string): unknown {
    const text = localStorage.getItem(keyOf(sequenceId, stepKey));
    if (text === null) return null;
    try {
      return JSON.parse(text);
    } catch (error) {
      // A text that isn't JSON was not written here.
      if (error instanceof SyntaxError) return null;
      throw error;
    }
  }

  keep(sequenceId: SequenceId, stepKey: string, typed: unknown): void {
    try {
      localStorage.setItem(keyOf(sequenceId, stepKey), JSON.stringify(typed));
    } catch (error) {
      // A full store costs only what is typed and not recorded; typing itself must go on.
      if (!(error instanceof DOMException)) throw error;
    }
  }

  forget(sequenceId: SequenceId, stepKey: string): void {
    localStorage.removeItem(keyOf(sequenceId, stepKey));
  }
}
