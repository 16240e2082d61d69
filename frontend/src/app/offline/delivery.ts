import { inject, Injectable } from '@angular/core';
import type { DeviceId, PersonId } from '#shared/plant/ids';
import { deliveryFailure, refusalReason, type DeliveryFailure } from './delivery-failure';
import { EntriesApi } from './entries-api';
import type { OutboxEntry } from './local-database';
import { OutboxStorage } from './outbox-storage';

const BATCH = 25;

/** How a run ended: everything it could do is done, or it stopped for one of the reasons. */
export type DeliveryEnd = 'done' | Exclude<DeliveryFailure, 'refused'>;

/** Carries waiting entries and photos to the server, oldest first. One bad one holds up no other. */
@Injectable({ providedIn: 'root' })
export class Delivery {
  private readonly storage = inject(OutboxStorage);
  private readonly api = inject(EntriesApi);

  async run(personId: PersonId, deviceId: DeviceId, progress: () => Promise<void>): Promise<DeliveryEnd> {
    const entries = (await this.storage.entriesOf(deviceId)).filter((entry) => entry.state === 'waiting');
    for (let start = 0; start < entries.length; start += BATCH) {
      const end = await this.sendEntries(entries.slice(start, start + BATCH));
      await progress();
      if (end !== 'done') return end;
    }
    return this.sendPhotos(personId, progress);
  }

  private async sendEntries(batch: readonly OutboxEntry[]): Promise<DeliveryEnd> {
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
      const failure = deliveryFailure(error);
      if (failure !== 'refused') return failure;
      return this.findTheBadOne(batch, error);
    }
  }

  /** A whole batch was turned down: each alone, so that only the one at fault is set aside. */
  private async findTheBadOne(batch: readonly OutboxEntry[], error: unknown): Promise<DeliveryEnd> {
    const [first, ...others] = batch;
    if (!first) return 'done';
    if (others.length === 0) {
      await this.storage.refuse(first.id, refusalReason(error));
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
      try {
        await this.api.sendPhoto(photo);
        await this.storage.markPhoto(photo, 'sent', null, new Date().toISOString());
      } catch (error) {
        const failure = deliveryFailure(error);
        if (failure !== 'refused') return failure;
        await this.storage.markPhoto(photo, 'refused', refusalReason(error), new Date().toISOString());
      }
      await progress();
    }
    return 'done';
  }
}
