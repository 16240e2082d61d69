import type { OutboxEntry } from './local-database';

const BATCH = 25;
/** An entry with a data logger's samples takes some 100 kB; the server takes 2 MB in one call. */
const BATCH_BYTES = 1_000_000;
/** From so many failures of the server on, an entry goes alone: the one that it fails on must hold up no other. */
const ALONE_FROM = 2;
/** From so many on, people are told. */
const STUCK_FROM = 5;

/** What goes out in one call. */
export interface Batch {
  readonly batch: readonly OutboxEntry[];
  /** Whether it is a single entry that the server may be failing on. */
  readonly isSuspect: boolean;
}

/**
 * Cuts what waits into calls: at most 25 entries of one device and about 1 MB each, in the order given, a larger entry by
 * itself; after them, each alone, those on which the server failed before, least often failed first, so that every one of
 * them gets its turn.
 */
export function batchesOf(entries: readonly OutboxEntry[]): readonly Batch[] {
  const waiting = entries.filter((entry) => entry.state === 'waiting');
  const good = waiting.filter((entry) => failuresOf(entry) < ALONE_FROM);
  const suspects = waiting
    .filter((entry) => failuresOf(entry) >= ALONE_FROM)
    .sort((a, b) => failuresOf(a) - failuresOf(b));
  return [
    ...cut(good).map((batch) => ({ batch, isSuspect: false })),
    ...suspects.map((entry) => ({ batch: [entry], isSuspect: true })),
  ];
}

function cut(entries: readonly OutboxEntry[]): readonly (readonly OutboxEntry[])[] {
  const batches: OutboxEntry[][] = [];
  let bytes = 0;
  for (const entry of entries) {
    const size = bytesOf(entry);
    const last = batches.at(-1);
    const fits = last && last.length < BATCH && bytes + size <= BATCH_BYTES;
    if (fits && last[0]?.deviceId === entry.deviceId) {
      last.push(entry);
      bytes += size;
    } else {
      batches.push([entry]);
      bytes = size;
    }
  }
  return batches;
}

/** What an entry takes in a call. Words in any language count with what they take in UTF-8. */
const bytesOf = ({ body, bodyHash }: OutboxEntry): number =>
  new Blob([JSON.stringify({ body, bodyHash })]).size;

/** Whether the server failed on an entry so often that a person should know. It stays in the queue all the same. */
export function isStuck(entry: OutboxEntry): boolean {
  return entry.state === 'waiting' && failuresOf(entry) >= STUCK_FROM;
}

const failuresOf = (entry: OutboxEntry): number => entry.serverFailures ?? 0;
