import zlib from 'node:zlib';
import { bodyHash } from '#shared/sequences/chain';
import { Browser } from './browser.mjs';
import { Phone, phoneOf } from './phones.mjs';
import { count, kilobytes, milliseconds } from './report.mjs';
import { postEntries } from './review-queue.mjs';
import { percentile } from './statistics.mjs';

const ENTRIES = 40;

/**
 * Opening a circuit with some 40 entries on an otherwise idle server: how long the answer takes, and how
 * many bytes a phone on a bad network has to fetch for it.
 * @param {{ port: number, seeded: import('./seed.mjs').Seeded, quick: boolean, log: (line: string) => void,
 *   stepperBytes: number | null }} context `stepperBytes`: the chunks that the page loads beyond the first
 *   screen, compressed; null when that was not measured
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureOpening({ port, seeded, quick, log, stepperBytes }) {
  const plan = phoneOf(seeded.quiet, 1);
  const phone = new Phone(plan, bodyHash);
  const sequenceId = phone.works[0].sequence.id;
  const browser = new Browser(port);
  await postEntries(browser, plan, phone.nextBatch(ENTRIES).entries);
  const times = [];
  for (let round = 0; round < (quick ? 100 : 500); round += 1) {
    times.push((await browser.get(`/api/sequences/${sequenceId}`)).ms);
  }
  const { body, headers } = await browser.get(`/api/sequences/${sequenceId}`);
  browser.close();
  const encoding = headers['content-encoding'] ?? 'uncompressed';
  const raw =
    encoding === 'br' ? zlib.brotliDecompressSync(body) : encoding === 'gzip' ? zlib.gunzipSync(body) : body;
  const [brotli, gzip] = [zlib.brotliCompressSync(raw).length, zlib.gzipSync(raw).length];
  const warm = times.slice(times.length / 5);
  log(
    `  p50 ${milliseconds(percentile(warm, 0.5))}, p95 ${milliseconds(percentile(warm, 0.95))}; sent ${encoding}`,
  );
  const scripts = stepperBytes === null ? '' : ` + ${kilobytes(stepperBytes)} of stepper scripts (once)`;
  return [
    {
      what: `Opening a circuit with ${count(ENTRIES)} entries, one connection`,
      ours: `p50 ${milliseconds(percentile(warm, 0.5))}, p95 ${milliseconds(percentile(warm, 0.95))}`,
      reference: '',
      ratio: null,
      goal: '',
      isMet: null,
    },
    {
      what: 'Bytes that a phone fetches for it',
      ours: `${kilobytes(body.length)} (${encoding})${scripts}`,
      reference: `${kilobytes(raw.length)} raw, ${kilobytes(gzip)} gzip, ${kilobytes(brotli)} brotli`,
      ratio: body.length / raw.length,
      goal: '',
      isMet: null,
    },
  ];
}
