import { setTimeout as sleep } from 'node:timers/promises';
import { residentBytes } from './stage.mjs';
import { count } from './report.mjs';
import { median } from './statistics.mjs';

const BATCH = 25;
const ENTRIES = 10_000;

/** A heap grows to its working size first; that is not what a leak looks like. */
const WARM_UP_ENTRIES = 10_000;

/**
 * The server's resident memory after a warm-up and after 10,000 more entries, half of them one by one.
 * @param {{ load: import('./load.mjs').Load, serverPid: number, log: (line: string) => void }} context targets
 *   `single` and `batch` are open
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureMemory({ load, serverPid, log }) {
  await sendEntries(load, WARM_UP_ENTRIES);
  const before = await settledBytes(serverPid);
  log(`  after the warm-up: ${megabytes(before)}`);
  await sendEntries(load, ENTRIES);
  const after = await settledBytes(serverPid);
  log(`  after ${count(ENTRIES)} more entries: ${megabytes(after)}`);
  return [
    {
      what: `Memory of the server after ${count(ENTRIES)} more entries`,
      ours: megabytes(after),
      reference: `${megabytes(before)} after the warm-up`,
      ratio: after / before,
      goal: 'at most 1.15',
      isMet: after / before <= 1.15,
    },
  ];
}

/**
 * @param {import('./load.mjs').Load} load
 * @param {number} entries
 */
async function sendEntries(load, entries) {
  const path = '/api/entries';
  const half = entries / 2;
  await load.run({ name: 'single', path, batch: 1, requests: half, durationMs: 600_000 });
  await load.run({ name: 'batch', path, batch: BATCH, requests: half / BATCH, durationMs: 600_000 });
}

/**
 * The middle of several looks, because the collector gives memory back when it likes.
 * @param {number} pid
 */
async function settledBytes(pid) {
  const looks = [];
  for (let look = 0; look < 9; look += 1) {
    await sleep(500);
    looks.push(residentBytes(pid));
  }
  return median(looks);
}

/** @param {number} bytes */
function megabytes(bytes) {
  return `${count(bytes / 1024 ** 2)} MB`;
}
