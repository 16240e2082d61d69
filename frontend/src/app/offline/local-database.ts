import { Injectable, signal } from '@angular/core';
import type { Judgement } from '#shared/checklist/judgement';
import type { CircuitRow } from '#shared/contracts/openings';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { DeviceId, EntryId, PersonId, SequenceId } from '#shared/plant/ids';
import type { EntryBody } from '#shared/sequences/entry';
import type { FoldEntry } from '#shared/sequences/fold';
import type { Refusal } from './delivery-failure';
import { openDB, type DBSchema, type IDBPDatabase } from 'idb';

/** Why something was refused; a sentence of the server where an earlier version of these pages kept it. */
export type KeptRefusal = Refusal | string | null;

/** An entry that the server hasn't acknowledged. `refused` stays until a person deals with it; nothing is dropped. */
export interface OutboxEntry {
  readonly id: EntryId;
  readonly deviceId: DeviceId;
  readonly sequenceId: SequenceId;
  readonly deviceCount: number;
  readonly body: EntryBody;
  readonly bodyHash: string;
  /** As judged on this phone; the server's own is the one that counts. */
  readonly judgement: Judgement | null;
  readonly state: 'waiting' | 'refused';
  readonly reason: KeptRefusal;
  /** How often the server failed while this entry was with it; absent before the first time. */
  readonly serverFailures?: number;
}

/** `draft`: taken, not recorded yet. `waiting`: an entry names it. `sent`: kept a while, so that it shows at once. */
export const LOCAL_PHOTO_STATES = ['draft', 'waiting', 'sent', 'refused'] as const;
export type LocalPhotoState = (typeof LOCAL_PHOTO_STATES)[number];

export interface LocalPhoto {
  readonly sequenceId: SequenceId;
  readonly sha256: string;
  readonly personId: PersonId;
  readonly stepKey: string;
  readonly bytes: ArrayBuffer;
  readonly originalSha256: string | null;
  readonly width: number;
  readonly height: number;
  readonly capturedAt: string | null;
  readonly state: LocalPhotoState;
  readonly reason: KeptRefusal;
  readonly changedAt: string;
}

/** A sequence as last read, and the entries of this phone that the server acknowledged since. */
export interface CachedSequence {
  readonly personId: PersonId;
  readonly sequenceId: SequenceId;
  readonly detail: SequenceDetail;
  readonly acknowledged: readonly FoldEntry[];
  readonly readAt: string;
}

export interface CachedWork {
  readonly personId: PersonId;
  readonly rows: readonly CircuitRow[];
  readonly readAt: string;
}

export interface FirstcoldSchema extends DBSchema {
  outbox: {
    key: EntryId;
    value: OutboxEntry;
    indexes: { bySequence: SequenceId; byDeviceCount: [DeviceId, number] };
  };
  photos: { key: [SequenceId, string]; value: LocalPhoto; indexes: { byState: LocalPhotoState } };
  sequences: { key: [PersonId, SequenceId]; value: CachedSequence };
  work: { key: PersonId; value: CachedWork };
  /** Highest counts given out: `device:<id>` for all entries, `sequence:<device>:<sequence>` for one sequence. */
  meta: { key: string; value: number };
}

/** `blocked`: an older tab holds the store. `displaced`: a newer tab wants it. `failed`: there is none to be had. */
export type DatabaseState = 'closed' | 'open' | 'blocked' | 'displaced' | 'failed';

const VERSION = 1;

/** The one IndexedDB of this browser; opened on first use, and again after the browser took it away. */
@Injectable({ providedIn: 'root' })
export class LocalDatabase {
  private readonly current = signal<DatabaseState>('closed');
  private opening: Promise<IDBPDatabase<FirstcoldSchema>> | null = null;

  readonly state = this.current.asReadonly();

  /** @throws {DOMException} when the browser gives none, as some do in private windows */
  open(): Promise<IDBPDatabase<FirstcoldSchema>> {
    this.opening ??= this.openNow().catch((error: unknown) => {
      this.opening = null;
      this.current.set('failed');
      throw error;
    });
    return this.opening;
  }

  async close(): Promise<void> {
    const database = await this.opening;
    database?.close();
    this.opening = null;
    this.current.set('closed');
  }

  private async openNow(): Promise<IDBPDatabase<FirstcoldSchema>> {
    const database = await openDB<FirstcoldSchema>('firstcold', VERSION, {
      upgrade: (fresh) => {
        const outbox = fresh.createObjectStore('outbox', { keyPath: 'id' });
        outbox.createIndex('bySequence', 'sequenceId');
        outbox.createIndex('byDeviceCount', ['deviceId', 'deviceCount'], { unique: true });
        const photos = fresh.createObjectStore('photos', { keyPath: ['sequenceId', 'sha256'] });
        photos.createIndex('byState', 'state');
        fresh.createObjectStore('sequences', { keyPath: ['personId', 'sequenceId'] });
        fresh.createObjectStore('work', { keyPath: 'personId' });
        fresh.createObjectStore('meta');
      },
      blocked: () => this.current.set('blocked'),
      blocking: (_current, _blocked, event) => {
        // A newer version in another tab waits for this one: make room, this page must be loaded anew.
        (event.target as IDBDatabase).close();
        this.opening = null;
        this.current.set('displaced');
      },
      terminated: () => {
        this.opening = null;
        this.current.set('closed');
      },
    });
    this.current.set('open');
    return database;
  }
}
