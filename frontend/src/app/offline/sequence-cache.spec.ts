import { TestBed } from '@angular/core/testing';
import { afterEach, beforeEach, describe, expect, it } from '@jest/globals';
import type { PersonId } from '#shared/plant/ids';
import {
  bodyOf,
  cachedOf,
  CONFIRMED,
  confirmStep,
  contentOf,
  ME,
  SEQUENCE,
  storedOf,
  uuid,
} from '../work/sequence/sequence.fixture';
import { newPhone } from './fake-database.fixture';
import { LocalDatabase } from './local-database';
import { SequenceCache } from './sequence-cache';

const OTHER = uuid(8) as PersonId;
const { detail } = cachedOf([confirmStep('a')], []);
let cache: SequenceCache;
let database: LocalDatabase;

beforeEach(() => {
  newPhone();
  cache = TestBed.inject(SequenceCache);
  database = TestBed.inject(LocalDatabase);
});

afterEach(() => database.close());

describe('SequenceCache', () => {
  it('keeps what one person read from another', async () => {
    await cache.keepSequence(ME, detail, 'now');
    expect(await cache.sequence(OTHER, SEQUENCE)).toBeNull();
  });

  it('keeps an acknowledged entry until a fresh copy holds it', async () => {
    const entry = storedOf(1, bodyOf(1, contentOf('a', CONFIRMED)));
    await cache.keepSequence(ME, detail, 'now');
    await (
      await database.open()
    ).put('sequences', { ...(await cache.sequence(ME, SEQUENCE))!, acknowledged: [entry] });
    expect((await cache.keepSequence(ME, detail, 'later')).acknowledged).toHaveLength(1);
    const fresh = { ...detail, entries: [entry] };
    expect((await cache.keepSequence(ME, fresh, 'later')).acknowledged).toEqual([]);
  });

  it('forgets one person only', async () => {
    await cache.keepSequence(ME, detail, 'now');
    await cache.keepSequence(OTHER, detail, 'now');
    await cache.keepWork(ME, [], 'now');
    await cache.forget(ME);
    expect(await cache.sequence(ME, SEQUENCE)).toBeNull();
    expect(await cache.work(ME)).toBeNull();
    expect(await cache.sequence(OTHER, SEQUENCE)).not.toBeNull();
  });
});
