import type { OutboxEntry } from './local-database';

const BATCH = 25;
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
 * Cuts what waits into calls: at most 25 entries of one device each, in the order given; after them, each alone, those on
 * which the server failed before, least often failed first, so that every one of them gets its turn.
 */
export function batchesOf(entries: readonly OutboxEntry[]): readonly Batch[] {
  const waiting = entries.filter((entry) => entry.state === 'waiting');
  const good = waiting.filter((entry) => failuresOf(entry) < ALONE_FROM);
  const suspects = waiting
    .filter((entry) => failuresOf(entry) >= ALONE_FROM)
    .sort((a, b) => failuresOf(a) - failuresOf(b));
  const batches: OutboxEntry[][] = [];
  for (const entry of good) {
    const last = batches.at(-1);
    if (last && last.length < BATCH && last[0]?.deviceId === entry.deviceId) last.push(entry);
    else batches.push([entry]);
  }
  return [
    ...batches.map((batch) => ({ batch, isSuspect: false })),
    ...suspects.map((entry) => ({ batch: [entry], isSuspect: true })),
  ];
}

/** Whether the server failed on an entry so often that a person should know. It stays in the queue all the same. */
export function isStuck(entry: OutboxEntry): boolean {
  return entry.state === 'waiting' && failuresOf(entry) >= STUCK_FROM;
}

const failuresOf = (entry: OutboxEntry): number => entry.serverFailures ?? 0;
