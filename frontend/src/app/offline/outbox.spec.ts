import { HttpErrorResponse } from '@angular/common/http';
import { signal, type WritableSignal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { afterEach, beforeEach, describe, expect, it } from '@jest/globals';
import type { EntryResult } from '#shared/contracts/sequences';
import type { Me } from '#shared/contracts/session';
import type { DeviceId, PersonId } from '#shared/plant/ids';
import { bodyHash } from '#shared/sequences/chain';
import { PhoneDevice } from '../session/phone-device';
import { Remembered } from '../session/remembered';
import { Session } from '../session/session';
import {
  bodyOf,
  cachedOf,
  CONFIRMED,
  contentOf,
  confirmStep,
  ME,
  PHONE,
  SEQUENCE,
  storedOf,
  uuid,
} from '../work/sequence/sequence.fixture';
import { EntriesApi } from './entries-api';
import { newPhone } from './fake-database.fixture';
import { LocalDatabase, type LocalPhoto, type OutboxEntry } from './local-database';
import { Outbox } from './outbox';
import { OutboxStorage } from './outbox-storage';
import { SequenceCache } from './sequence-cache';

const CONTEXT = { stepListHash: null, supersedes: null, judgement: null };
const content = (key: string) => contentOf(key, CONFIRMED);

/** A server that can be out of reach, and keeps what it is given. */
class FakeServer {
  mode: 'away' | 'here' | 'silent' = 'here';
  failsOn: string | null = null;
  refuses: string | null = null;
  readonly calls: OutboxEntry[][] = [];
  readonly photos: string[] = [];
  private readonly stored: string[] = [];

  send(entries: readonly OutboxEntry[]): Promise<readonly EntryResult[]> {
    if (this.mode === 'away') return Promise.reject(new HttpErrorResponse({ status: 0 }));
    this.calls.push([...entries]);
    if (entries.some(({ body: { content } }) => 'stepKey' in content && content.stepKey === this.failsOn))
      return Promise.reject(new HttpErrorResponse({ status: 500 }));
    const results = entries.map((entry) => this.take(entry));
    // The answer is lost on the way back: the server has the entries, the phone doesn't know.
    return this.mode === 'silent'
      ? Promise.reject(new HttpErrorResponse({ status: 0 }))
      : Promise.resolve(results);
  }

  sendPhoto(photo: LocalPhoto): Promise<void> {
    if (this.mode === 'away') return Promise.reject(new HttpErrorResponse({ status: 0 }));
    this.photos.push(photo.sha256);
    return Promise.resolve();
  }

  private take({ id, body }: OutboxEntry): EntryResult {
    if (body.content.kind === 'answer' && body.content.stepKey === this.refuses) {
      const reason = { code: 'otherAuthor', params: {} } as const;
      return { result: 'refused', id, reason, message: 'Not yours.' };
    }
    const known = this.stored.includes(id);
    if (!known) this.stored.push(id);
    const result = known ? 'alreadyStored' : 'stored';
    const position = this.stored.indexOf(id) + 1;
    return {
      result,
      id,
      position,
      standing: 'inOrder',
      judgement: null,
      hash: 'b'.repeat(64),
      state: 'open',
    };
  }
}

let server: FakeServer;
let device: WritableSignal<DeviceId>;
let lastCount: number;
/** Who this browser was last signed in as: another tab may have changed it. */
let here: PersonId;
let database: LocalDatabase;

beforeEach(() => {
  newPhone();
  server = new FakeServer();
  lastCount = 0;
  here = ME;
  device = signal(PHONE);
  TestBed.configureTestingModule({
    providers: [
      { provide: EntriesApi, useValue: server },
      { provide: Session, useValue: { me: signal({ id: ME } as Me) } },
      { provide: Remembered, useValue: { me: () => ({ id: here }) } },
      { provide: PhoneDevice, useValue: { deviceId: device, lastCount: () => lastCount } },
    ],
  });
  database = TestBed.inject(LocalDatabase);
});

afterEach(() => database.close());

describe('Outbox.drain', () => {
  it('sends nothing once somebody else is signed in here, and keeps it for its author', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    await outbox.append(SEQUENCE, content('a'), CONTEXT);
    server.mode = 'here';
    here = uuid(77) as PersonId;
    await outbox.drain();
    expect(server.calls).toEqual([]);
    here = ME;
    await outbox.drain();
    expect(server.calls).toHaveLength(1);
  });
});

describe('Outbox.append', () => {
  it('numbers entries without a gap, also when several are recorded at once', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    const made = await Promise.all(
      ['a', 'b', 'c'].map((key) => outbox.append(SEQUENCE, content(key), CONTEXT)),
    );
    expect(made.map((entry) => entry.deviceCount).sort()).toEqual([1, 2, 3]);
    expect(made.map((entry) => entry.body.countOnSequence).sort()).toEqual([1, 2, 3]);
  });

  it('counts on above what the server has of this device', async () => {
    lastCount = 40;
    const entry = await TestBed.inject(Outbox).append(SEQUENCE, content('a'), CONTEXT);
    expect(entry.deviceCount).toBe(41);
    expect(entry.body.countOnSequence).toBe(1);
  });

  it('counts on above what a read sequence shows of this device', async () => {
    const before = storedOf(1, bodyOf(7, content('a')));
    await TestBed.inject(SequenceCache).keepSequence(
      ME,
      cachedOf([confirmStep('a')], [before]).detail,
      'now',
    );
    const entry = await TestBed.inject(Outbox).append(SEQUENCE, content('a'), CONTEXT);
    expect(entry.body.countOnSequence).toBe(8);
    expect(entry.deviceCount).toBe(8);
  });

  it('hashes exactly the body that is sent', async () => {
    const entry = await TestBed.inject(Outbox).append(SEQUENCE, content('a'), CONTEXT);
    expect(entry.bodyHash).toBe(bodyHash(entry.body));
  });

  it('is stored though nobody can be reached', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    await outbox.append(SEQUENCE, content('a'), CONTEXT);
    await outbox.drain();
    expect(outbox.waitingCount()).toBe(1);
    expect(outbox.end()).toBe('later');
  });
});

describe('Outbox.drain', () => {
  it('delivers in order and empties the outbox', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    for (const key of ['a', 'b', 'c']) await outbox.append(SEQUENCE, content(key), CONTEXT);
    await outbox.drain();
    server.mode = 'here';
    await outbox.drain();
    expect(server.calls.flat().map((entry) => entry.deviceCount)).toEqual([1, 2, 3]);
    expect(outbox.waitingCount()).toBe(0);
  });

  it('puts an acknowledged entry beside the cached sequence in the same moment', async () => {
    const cache = TestBed.inject(SequenceCache);
    await cache.keepSequence(ME, cachedOf([confirmStep('a')], []).detail, 'now');
    const outbox = TestBed.inject(Outbox);
    const entry = await outbox.append(SEQUENCE, content('a'), CONTEXT);
    await outbox.drain();
    const cached = await cache.sequence(ME, SEQUENCE);
    expect(cached?.acknowledged.map(({ body, server: { position } }) => [body.id, position])).toEqual([
      [entry.id, 1],
    ]);
  });

  it('sends again after an answer was lost, and the server stores it once', async () => {
    const outbox = TestBed.inject(Outbox);
    server.mode = 'silent';
    await outbox.append(SEQUENCE, content('a'), CONTEXT);
    await outbox.drain();
    expect(outbox.waitingCount()).toBe(1);
    server.mode = 'here';
    await outbox.drain();
    expect(outbox.waitingCount()).toBe(0);
    expect(new Set(server.calls.flat().map((entry) => entry.id)).size).toBe(1);
  });

  it('keeps a refused entry with its reason, and delivers the others', async () => {
    server.refuses = 'b';
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    for (const key of ['a', 'b', 'c']) await outbox.append(SEQUENCE, content(key), CONTEXT);
    await outbox.drain();
    server.mode = 'here';
    await outbox.drain();
    expect(outbox.refused().map(({ reason }) => reason)).toEqual([{ code: 'otherAuthor', params: {} }]);
    expect(outbox.waitingCount()).toBe(0);
    server.refuses = null;
    await outbox.retry(outbox.refused()[0]!.id);
    await outbox.drain();
    expect(outbox.entries()).toEqual([]);
  });

  it('delivers also what was recorded before this phone became another device', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    await outbox.append(SEQUENCE, content('a'), CONTEXT);
    await outbox.drain();
    device.set(uuid(77) as DeviceId);
    server.mode = 'here';
    await outbox.append(SEQUENCE, content('b'), CONTEXT);
    // The first call may only join a run that began before the second entry was there.
    await outbox.drain();
    await outbox.drain();
    expect(new Set(server.calls.flat().map((entry) => entry.deviceId)).size).toBe(2);
    expect(outbox.waitingCount()).toBe(0);
  });

  it('finds the one entry that the server fails on, delivers the others, and keeps it', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    for (const key of ['a', 'b', 'c']) await outbox.append(SEQUENCE, content(key), CONTEXT);
    await outbox.drain();
    server.mode = 'here';
    server.failsOn = 'a';
    for (let tries = 0; tries < 3; tries += 1) await outbox.drain();
    expect(outbox.entries().map(({ deviceCount }) => deviceCount)).toEqual([1]);
    expect(outbox.stuck()).toEqual([]);
    for (let tries = 0; tries < 2; tries += 1) await outbox.drain();
    expect(outbox.stuck()).toHaveLength(1);
    server.failsOn = null;
    await outbox.drain();
    expect(outbox.entries()).toEqual([]);
  });

  it('sends at most 25 entries at a time', async () => {
    server.mode = 'away';
    const outbox = TestBed.inject(Outbox);
    for (let number = 0; number < 30; number += 1)
      await outbox.append(SEQUENCE, content(`s${number}`), CONTEXT);
    await outbox.drain();
    server.mode = 'here';
    await outbox.drain();
    expect(server.calls.map((call) => call.length)).toEqual([25, 5]);
  });

  it('sends the photos that an entry names, after the entry', async () => {
    const outbox = TestBed.inject(Outbox);
    const sha256 = 'c'.repeat(64);
    const photo = { sha256, originalSha256: null, width: 4, height: 3, capturedAt: null };
    const draft: LocalPhoto = {
      ...photo,
      sequenceId: SEQUENCE,
      personId: ME,
      stepKey: 'p',
      bytes: new ArrayBuffer(8),
      state: 'draft',
      reason: null,
      changedAt: 'now',
    };
    await outbox.keepPhoto(draft);
    expect(outbox.waitingCount()).toBe(0);
    await outbox.append(
      SEQUENCE,
      contentOf('p', { kind: 'photo', photos: [{ ...photo, bytes: 8 }] }),
      CONTEXT,
    );
    await outbox.drain();
    expect(server.photos).toEqual([sha256]);
    expect((await TestBed.inject(OutboxStorage).photo(SEQUENCE, sha256))?.state).toBe('sent');
  });
});
