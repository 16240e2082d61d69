import { count, milliseconds } from './report.mjs';
import { median } from './statistics.mjs';

const PATH = '/api/entries';
const BATCH = 25;

/** Prepared for each second of a round: more than the fastest machine sends, since they are made beforehand. */
const BARE_PER_SECOND = 6_000;
const SINGLES_PER_SECOND = 3_000;
const BATCHES_PER_SECOND = 500;

/**
 * @typedef {import('./load.mjs').LoadResult} LoadResult
 * @typedef {object} SavingContext
 * @property {import('./load.mjs').Load} load
 * @property {boolean} quick
 * @property {(line: string) => void} log
 */

/**
 * Saving entries over 32 connections and 1,000 sequences, through everything that the product does to one,
 * against the bare route. Rounds take turns, so that a disturbance hits both.
 * @param {SavingContext} context targets `bare`, `single` and `batch` are open
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureSaving({ load, quick, log }) {
  const rounds = quick ? 1 : 5;
  const durationMs = quick ? 3_000 : 6_000;
  const orders = {
    bare: { name: 'bare', path: '/entries', batch: 1, perSecond: BARE_PER_SECOND },
    single: { name: 'single', path: PATH, batch: 1, perSecond: SINGLES_PER_SECOND },
    batch: { name: 'batch', path: PATH, batch: BATCH, perSecond: BATCHES_PER_SECOND },
  };
  /** @type {Record<keyof typeof orders, LoadResult[]>} */
  const results = { bare: [], single: [], batch: [] };
  for (let round = 0; round <= rounds; round += 1) {
    for (const key of /** @type {(keyof typeof orders)[]} */ (Object.keys(orders))) {
      const { perSecond, ...order } = orders[key];
      // Round 0 warms up: compilers, pools and caches.
      const ms = round === 0 ? Math.min(durationMs, 3_000) : durationMs;
      const result = await load.run({ ...order, requests: (perSecond * ms) / 1000, durationMs: ms });
      if (round > 0) results[key].push(result);
      log(`  ${round === 0 ? 'warm-up' : `round ${round}`} ${describe(key, result)}`);
    }
  }
  return toRows(results, load.connections);
}

/**
 * @param {string} key
 * @param {LoadResult} result
 */
function describe(key, { perSecond, p50Ms, p99Ms, ranDry }) {
  const rate = `${count(perSecond).padStart(6)} requests/s`;
  return `${key.padEnd(6)} ${rate}, p50 ${milliseconds(p50Ms)}, p99 ${milliseconds(p99Ms)}${ranDry ? ' (ran dry)' : ''}`;
}

/**
 * @param {Record<'bare' | 'single' | 'batch', LoadResult[]>} results
 * @param {number} connections
 * @returns {import('./report.mjs').Row[]}
 */
function toRows({ bare, single, batch }, connections) {
  const rate = (/** @type {LoadResult[]} */ all) => median(all.map((result) => result.perSecond));
  const p99 = (/** @type {LoadResult[]} */ all) => median(all.map((result) => result.p99Ms));
  const throughput = rate(single) / rate(bare);
  const tail = p99(single) / p99(bare);
  const entries = rate(batch) * BATCH;
  return [
    {
      what: `Saving single entries, ${connections} connections, 1,000 circuits`,
      ours: `${count(rate(single))} entries/s`,
      reference: `${count(rate(bare))} requests/s of a bare route (one insert, one update)`,
      ratio: throughput,
      goal: 'at least 0.25',
      isMet: throughput >= 0.25,
    },
    {
      what: 'The same, slowest 1 % (p99)',
      ours: milliseconds(p99(single)),
      reference: `${milliseconds(p99(bare))} of the bare route`,
      ratio: tail,
      goal: 'at most 4',
      isMet: tail <= 4,
    },
    {
      what: `Saving entries in batches of ${BATCH}, as an outbox drains`,
      ours: `${count(entries)} entries/s`,
      reference: `${count(rate(bare))} requests/s of the bare route`,
      ratio: entries / rate(bare),
      goal: 'at least 1',
      isMet: entries >= rate(bare),
    },
  ];
}
