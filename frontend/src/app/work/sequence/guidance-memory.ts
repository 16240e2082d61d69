import { Injectable } from '@angular/core';
import type { SequenceId } from '#shared/plant/ids';

const keyOf = (sequenceId: SequenceId): string => `firstcold.guidance.${sequenceId}`;

/** Whether somebody reads a circuit's instructions in full: asked once per circuit, not once per step. */
@Injectable({ providedIn: 'root' })
export class GuidanceMemory {
  isOpen(sequenceId: SequenceId): boolean {
    return localStorage.getItem(keyOf(sequenceId)) !== null;
  }

  keep(sequenceId: SequenceId, isOpen: boolean): void {
    try {
      if (isOpen) localStorage.setItem(keyOf(sequenceId), '1');
      else localStorage.removeItem(keyOf(sequenceId));
    } catch (error) {
      // A full store costs only this convenience.
      if (!(error instanceof DOMException)) throw error;
    }
  }
}
