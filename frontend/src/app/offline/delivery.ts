import { inject, Injectable } from '@angular/core';
import type { PersonId } from '#shared/plant/ids';
import { deliveryFailure, isServerFailure, refusalOf, type DeliveryFailure } from './delivery-failure';
import { batchesOf } from './delivery-batches';
import { EntriesApi } from './entries-api';
import { Remembered } from '../session/remembered';
import type { OutboxEntry } from './local-database';
import { OutboxStorage } from './outbox-storage';

/** After so many single entries in a row on which the server failed, it is the server and not the entries. */
const FAILURES_IN_A_ROW = 3;

/** How a run ended: everything it could do is done, or it stopped for one of the reasons. */
export type DeliveryEnd = 'done' | Exclude<DeliveryFailure, 'refused'>;

/** How one call ended; `serverFailed` is kept apart from `later`, because one entry alone may be the cause. */
type SendEnd = DeliveryEnd | 'serverFailed';

/** Carries waiting entries and photos to the server, oldest first. One bad one holds up no other. */
@Injectable({ providedIn: 'root' })
export class Delivery {
  private readonly storage = inject(OutboxStorage);
  private readonly api = inject(EntriesApi);
  private readonly remembered = inject(Remembered);

  async run(personId: PersonId, progress: () => Promise<void>): Promise<DeliveryEnd> {
    const entries = await this.storage.entriesOf(personId);
    let failedInARow = 0;
    let end: DeliveryEnd = 'done';
    for (const { batch, isSuspect } of batchesOf(entries)) {
      if (!this.isStillHere(personId)) return 'signIn';
      const sent = await this.sendEntries(batch);
      await progress();
      failedInARow = sent === 'serverFailed' && isSuspect ? failedInARow + 1 : 0;
      if (sent === 'serverFailed' && isSuspect && failedInARow < FAILURES_IN_A_ROW) end = 'later';
      else if (sent !== 'done') return sent === 'serverFailed' ? 'later' : sent;
    }
    const photos = await this.sendPhotos(personId, progress);
    return photos === 'done' ? end : photos;
  }

  /** Another person may have signed in, here or in another tab: what is sent then would go out in their name. */
  private isStillHere(personId: PersonId): boolean {
    return this.remembered.me()?.id === personId;
  }

  private async sendEntries(batch: readonly OutboxEntry[]): Promise<SendEnd> {
    try {
      const results = await this.api.send(batch);
      for (const [index, entry] of batch.entries()) {
        const result = results.find((candidate) => candidate.id === entry.id) ?? results[index];
        // A server that is silent about an entry has not taken it: it stays and goes out again.
        if (!result) continue;
        if (result.result === 'refused') await this.storage.refuse(entry.id, result.reason);
        else await this.storage.acknowledge(entry, result);
      }
      return 'done';
    } catch (error) {
      if (isServerFailure(error)) {
        await this.storage.noteServerFailure(batch.map((entry) => entry.id));
        return 'serverFailed';
      }
      const failure = deliveryFailure(error);
      if (failure !== 'refused') return failure;
      return this.findTheBadOne(batch, error);
    }
  }

  /** A whole batch was turned down: each alone, so that only the one at fault is set aside. */
  private async findTheBadOne(batch: readonly OutboxEntry[], error: unknown): Promise<SendEnd> {
    const [first, ...others] = batch;
    if (!first) return 'done';
    if (others.length === 0) {
      await this.storage.refuse(first.id, refusalOf(error));
      return 'done';
    }
    for (const entry of batch) {
      const end = await this.sendEntries([entry]);
      if (end !== 'done') return end;
    }
    return 'done';
  }

  private async sendPhotos(personId: PersonId, progress: () => Promise<void>): Promise<DeliveryEnd> {
    for (const photo of await this.storage.photos(personId, 'waiting')) {
      if (!this.isStillHere(personId)) return 'signIn';
      try {
        await this.api.sendPhoto(photo);
        await this.storage.markPhoto(photo, 'sent', null, new Date().toISOString());
      } catch (error) {
        const failure = deliveryFailure(error);
        if (failure !== 'refused') return failure;
        await this.storage.markPhoto(photo, 'refused', refusalOf(error), new Date().toISOString());
      }
      await progress();
    }
    return 'done';
  }
}
