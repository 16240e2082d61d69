import { describe, expect, it } from '@jest/globals';
import type { DeviceId } from '#shared/plant/ids';
import { bodyOf, CONFIRMED, contentOf, uuid, waitingOf } from '../work/sequence/sequence.fixture';
import { batchesOf, isStuck } from './delivery-batches';
import type { OutboxEntry } from './local-database';

const entry = (count: number, more: Partial<OutboxEntry> = {}): OutboxEntry =>
  waitingOf(bodyOf(count, contentOf('a', CONFIRMED)), more);
const counts = (entries: readonly OutboxEntry[]): number[][] =>
  batchesOf(entries).map(({ batch }) => batch.map(({ deviceCount }) => deviceCount));

describe('batchesOf', () => {
  it('keeps devices apart and leaves refused entries out', () => {
    const other = { deviceId: uuid(7) as DeviceId };
    expect(counts([entry(1), entry(2, { state: 'refused' }), entry(3), entry(1, other)])).toEqual([
      [1, 3],
      [1],
    ]);
  });

  const large = (count: number, characters: number): OutboxEntry =>
    waitingOf(bodyOf(count, contentOf('a', { kind: 'note', text: 'é'.repeat(characters) })));

  it('sends no more than 25 entries at once', () => {
    const many = Array.from({ length: 51 }, (_, index) => entry(index + 1));
    expect(counts(many).map(({ length }) => length)).toEqual([25, 25, 1]);
  });

  it('sends no more than about 1 MB at once, and keeps the order', () => {
    // Two bytes a letter: 300 kB each, of which three go into one call.
    const all = Array.from({ length: 7 }, (_, index) => large(index + 1, 150_000));
    expect(counts(all)).toEqual([[1, 2, 3], [4, 5, 6], [7]]);
  });

  it('sends an entry that is larger by itself', () => {
    expect(counts([entry(1), large(2, 600_000), entry(3), entry(4)])).toEqual([[1], [2], [3, 4]]);
  });

  it('sends alone, and last, what the server failed on twice, the least failed first', () => {
    const failed = (count: number, serverFailures: number) => entry(count, { serverFailures });
    expect(counts([failed(1, 4), failed(2, 2), failed(3, 1), entry(4)])).toEqual([[3, 4], [2], [1]]);
  });
});

describe('isStuck', () => {
  it('says so from the fifth failure on', () => {
    expect([4, 5].map((serverFailures) => isStuck(entry(1, { serverFailures })))).toEqual([false, true]);
  });
});
