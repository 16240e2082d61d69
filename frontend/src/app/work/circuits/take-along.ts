import { inject, Injectable } from '@angular/core';
import type { CircuitRow } from '#shared/contracts/openings';
import type { PersonId } from '#shared/plant/ids';
import type { SequenceState } from '#shared/sequences/transitions';
import { TimeoutError } from 'rxjs';
import { SequenceCache } from '../../offline/sequence-cache';
import { httpFailure } from '../../session/problem-code';
import { WorkApi } from '../work-api';

const GOOD_FOR_MS = 6 * 3_600_000;

/** Reads the day's circuits while there is a network, so that every one of them opens where there is none. */
@Injectable({ providedIn: 'root' })
export class TakeAlong {
  private readonly api = inject(WorkApi);
  private readonly cache = inject(SequenceCache);
  private isRunning = false;

  /** One after the other, gently; stops at the first that can't be read. What is here and fresh is left alone. */
  async take(personId: PersonId, rows: readonly CircuitRow[]): Promise<void> {
    if (this.isRunning) return;
    this.isRunning = true;
    try {
      // The stepper's own code too: without a network it couldn't be loaded.
      await import('../sequence/sequence-page');
      for (const row of rows) await this.takeOne(personId, row);
    } catch (error) {
      // The network went away, or a circuit was taken from this person meanwhile: the next reading of the list goes on.
      if (!httpFailure(error) && !(error instanceof TimeoutError)) throw error;
    } finally {
      this.isRunning = false;
    }
  }

  private async takeOne(personId: PersonId, row: CircuitRow): Promise<void> {
    if (!row.sequenceId || row.state === 'approved') return;
    const kept = await this.cache.sequence(personId, row.sequenceId);
    if (
      kept &&
      Date.parse(kept.readAt) > Date.now() - GOOD_FOR_MS &&
      isSameState(kept.detail.fold.state, row.state)
    )
      return;
    const detail = await this.api.sequence(row.sequenceId);
    await this.cache.keepSequence(personId, detail, new Date().toISOString());
  }
}

/** A row tells circuits not yet begun from those under way; a sequence is `open` in both. */
function isSameState(kept: SequenceState, row: CircuitRow['state']): boolean {
  return kept === row || (kept === 'open' && row === 'underWay');
}
