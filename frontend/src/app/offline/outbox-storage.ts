import { inject, Injectable } from '@angular/core';
import type { EntryResult } from '#shared/contracts/sequences';
import type { EntryId, PersonId, SequenceId } from '#shared/plant/ids';
import type { FoldEntry } from '#shared/sequences/fold';
import { appendEntry, type NewEntry } from './append-entry';
import type { Refusal } from './delivery-failure';
import { LocalDatabase, type LocalPhoto, type LocalPhotoState, type OutboxEntry } from './local-database';

type Stored = Extract<EntryResult, { result: 'stored' | 'alreadyStored' }>;

/** What the outbox does with the local store: each method is one transaction. */
@Injectable({ providedIn: 'root' })
export class OutboxStorage {
  private readonly local = inject(LocalDatabase);

  async append(fresh: NewEntry): Promise<OutboxEntry> {
    return appendEntry(await this.local.open(), fresh);
  }

  /**
   * Entries of one person, waiting and refused: device by device, each oldest first. Also those made under a device that
   * was replaced since, which would otherwise never leave.
   */
  async entriesOf(personId: PersonId): Promise<readonly OutboxEntry[]> {
    const all = await (await this.local.open()).getAllFromIndex('outbox', 'byDeviceCount');
    return all.filter((entry) => entry.body.authorId === personId);
  }

  /** The server has it: out of the outbox and beside the cached sequence, in one step. */
  async acknowledge(entry: OutboxEntry, result: Stored): Promise<void> {
    const transaction = (await this.local.open()).transaction(['outbox', 'sequences'], 'readwrite');
    await transaction.objectStore('outbox').delete(entry.id);
    const sequences = transaction.objectStore('sequences');
    const cached = await sequences.get([entry.body.authorId, entry.sequenceId]);
    if (cached && !cached.acknowledged.some((known) => known.body.id === entry.id)) {
      const { position, standing, judgement, hash } = result;
      const stored: FoldEntry = { body: entry.body, server: { position, standing, judgement }, hash };
      await sequences.put({ ...cached, acknowledged: [...cached.acknowledged, stored] });
    }
    await transaction.done;
  }

  /** Kept, with the reason, until a person deals with it. */
  async refuse(id: EntryId, reason: Refusal): Promise<void> {
    await this.change(id, { state: 'refused', reason });
  }

  /** Counts that the server failed while it had these entries: one of them may be what it fails on. */
  async noteServerFailure(ids: readonly EntryId[]): Promise<void> {
    const transaction = (await this.local.open()).transaction('outbox', 'readwrite');
    for (const id of ids) {
      const entry = await transaction.store.get(id);
      if (entry) await transaction.store.put({ ...entry, serverFailures: (entry.serverFailures ?? 0) + 1 });
    }
    await transaction.done;
  }

  /** Back in the queue, after whatever stood against it was put right. */
  async retry(id: EntryId): Promise<void> {
    await this.change(id, { state: 'waiting', reason: null });
  }

  /** Keeps a new picture. One that is here already stays as it is: it may be evidence of another step, or on its way. */
  async keepPhoto(photo: LocalPhoto): Promise<void> {
    const transaction = (await this.local.open()).transaction('photos', 'readwrite');
    const known = await transaction.store.get([photo.sequenceId, photo.sha256]);
    if (!known) await transaction.store.put(photo);
    await transaction.done;
  }

  /** Only a draft can be removed: what an entry names is evidence. */
  async removeDraft(sequenceId: SequenceId, sha256: string): Promise<void> {
    const transaction = (await this.local.open()).transaction('photos', 'readwrite');
    const photo = await transaction.store.get([sequenceId, sha256]);
    if (photo?.state === 'draft') await transaction.store.delete([sequenceId, sha256]);
    await transaction.done;
  }

  async photo(sequenceId: SequenceId, sha256: string): Promise<LocalPhoto | null> {
    return (await (await this.local.open()).get('photos', [sequenceId, sha256])) ?? null;
  }

  async photos(personId: PersonId, state: LocalPhotoState): Promise<readonly LocalPhoto[]> {
    const all = await (await this.local.open()).getAllFromIndex('photos', 'byState', state);
    return all.filter((photo) => photo.personId === personId);
  }

  async markPhoto(
    photo: LocalPhoto,
    state: LocalPhotoState,
    reason: Refusal | null,
    now: string,
  ): Promise<void> {
    await (await this.local.open()).put('photos', { ...photo, state, reason, changedAt: now });
  }

  /** Makes room: photos that the server has, last touched before the given time. */
  async dropSentPhotos(before: string): Promise<void> {
    const transaction = (await this.local.open()).transaction('photos', 'readwrite');
    for await (const cursor of transaction.store.index('byState').iterate('sent')) {
      if (cursor.value.changedAt < before) await cursor.delete();
    }
    await transaction.done;
  }

  private async change(id: EntryId, change: Pick<OutboxEntry, 'state' | 'reason'>): Promise<void> {
    const transaction = (await this.local.open()).transaction('outbox', 'readwrite');
    const entry = await transaction.store.get(id);
    if (entry) await transaction.store.put({ ...entry, ...change });
    await transaction.done;
  }
}
