import { inject, Injectable } from '@angular/core';
import type { CircuitRow } from '#shared/contracts/openings';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { PersonId, SequenceId } from '#shared/plant/ids';
import { LocalDatabase, type CachedSequence, type CachedWork } from './local-database';

/** What was last read from the server, kept so that the day's work opens without a network. */
@Injectable({ providedIn: 'root' })
export class SequenceCache {
  private readonly local = inject(LocalDatabase);

  async sequence(personId: PersonId, sequenceId: SequenceId): Promise<CachedSequence | null> {
    return (await (await this.local.open()).get('sequences', [personId, sequenceId])) ?? null;
  }

  /** Keeps a fresh copy. Entries acknowledged while it was on its way, and not in it yet, stay beside it. */
  async keepSequence(personId: PersonId, detail: SequenceDetail, readAt: string): Promise<CachedSequence> {
    const transaction = (await this.local.open()).transaction('sequences', 'readwrite');
    const known = await transaction.store.get([personId, detail.id]);
    // Answers may overtake each other: the older one must not take entries away again.
    if (known && known.detail.entries.length > detail.entries.length) {
      await transaction.done;
      return known;
    }
    const arrived = new Set(detail.entries.map((entry) => entry.body.id));
    const acknowledged = (known?.acknowledged ?? []).filter((entry) => !arrived.has(entry.body.id));
    const fresh: CachedSequence = { personId, sequenceId: detail.id, detail, acknowledged, readAt };
    await transaction.store.put(fresh);
    await transaction.done;
    return fresh;
  }

  async work(personId: PersonId): Promise<CachedWork | null> {
    return (await (await this.local.open()).get('work', personId)) ?? null;
  }

  async keepWork(personId: PersonId, rows: readonly CircuitRow[], readAt: string): Promise<void> {
    await (await this.local.open()).put('work', { personId, rows, readAt });
  }

  /** Clears what was read for a person who signed out. What they recorded and isn't sent yet stays in the outbox. */
  async forget(personId: PersonId): Promise<void> {
    const transaction = (await this.local.open()).transaction(['sequences', 'work'], 'readwrite');
    await transaction
      .objectStore('sequences')
      .delete(IDBKeyRange.bound([personId, ''], [personId, '\uffff']));
    await transaction.objectStore('work').delete(personId);
    await transaction.done;
  }
}
