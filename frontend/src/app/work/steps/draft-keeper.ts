import { Injectable } from '@angular/core';
import type { SequenceId } from '#shared/plant/ids';

const FORMAT = 1;
const PREFIX = `firstcold.draft.${FORMAT}.`;
const keyOf = (sequenceId: SequenceId, stepKey: string): string => `${PREFIX}${sequenceId}.${stepKey}`;

/** A draft that this browser keeps. */
export interface KeptDraft {
  readonly sequenceId: SequenceId;
  readonly stepKey: string;
  readonly typed: unknown;
}

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

  /** All drafts of this browser, of whatever circuit and whoever typed them. */
  all(): readonly KeptDraft[] {
    return Object.keys(localStorage)
      .filter((key) => key.startsWith(PREFIX))
      .flatMap((key) => {
        // An id holds no dot; a step's key may.
        const [, sequenceId, stepKey] = /^([^.]+)\.(.+)$/.exec(key.slice(PREFIX.length)) ?? [];
        if (!sequenceId || !stepKey) return [];
        const id = sequenceId as SequenceId;
        return [{ sequenceId: id, stepKey, typed: this.read(id, stepKey) }];
      });
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
