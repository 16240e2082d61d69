import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { entryBatchResponseSchema, type EntryResult } from '#shared/contracts/sequences';
import { firstValueFrom, timeout } from 'rxjs';
import { quietly } from '../session/session-context';
import type { LocalPhoto, OutboxEntry } from './local-database';

const ENTRIES_TIMEOUT_MS = 30_000;
const PHOTO_TIMEOUT_MS = 120_000;

/** Delivers what a phone recorded. Never opens a dialog: the outbox works in the background. */
@Injectable({ providedIn: 'root' })
export class EntriesApi {
  private readonly http = inject(HttpClient);

  /** @returns one result for each entry, in the same order */
  async send(entries: readonly OutboxEntry[]): Promise<readonly EntryResult[]> {
    const body = { entries: entries.map((entry) => ({ body: entry.body, bodyHash: entry.bodyHash })) };
    const call = this.http
      .post('/api/entries', body, { context: quietly() })
      .pipe(timeout(ENTRIES_TIMEOUT_MS));
    return entryBatchResponseSchema.parse(await firstValueFrom(call)).results;
  }

  async sendPhoto(photo: LocalPhoto): Promise<void> {
    const form = new FormData();
    form.set('photo', new Blob([photo.bytes], { type: 'image/jpeg' }), `${photo.sha256}.jpg`);
    const url = `/api/sequences/${photo.sequenceId}/photos/${photo.sha256}`;
    await firstValueFrom(this.http.put(url, form, { context: quietly() }).pipe(timeout(PHOTO_TIMEOUT_MS)));
  }
}
