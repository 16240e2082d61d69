import { Worker } from 'node:worker_threads';
import { ScriptFailure } from '../failure.mjs';
import { PROJECT_ROOT } from '../paths.mjs';
import { runTool } from '../processes.mjs';
import { count } from './report.mjs';
import { median } from './statistics.mjs';

const ROWS = 200_000;
const EVERY_S = 2;
/** What a phone's user waits without wondering. */
const GOAL_S = 2;

/**
 * Reads and analyses a data logger's trace in a thread, as the phone does, against a bare loop over the same text that
 * splits lines and cells and turns them into numbers: what dates, units, missing cells, order and the judgement cost.
 * @param {{ quick: boolean, log: (line: string) => void }} context
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureLogger({ quick, log }) {
  await compileReader();
  const text = trace();
  const rounds = quick ? 2 : 5;
  const ours = /** @type {Round[]} */ ([]);
  const bare = /** @type {Round[]} */ ([]);
  for (let round = 0; round < rounds; round += 1) {
    bare.push(await inThread('bare', text));
    ours.push(await inThread('ours', text));
  }
  const [own, reference] = [ours, bare].map((all) => ({
    seconds: median(all.map(({ seconds }) => seconds)),
    megabytes: median(all.map(({ bytes }) => bytes)) / 1e6,
  }));
  log(
    `  ${count(ROWS)} rows, ${count(text.length / 1e6, 1)} MB: ${own.seconds.toFixed(2)} s against ${reference.seconds.toFixed(2)} s; the trace is ${ours[0].outcome}`,
  );
  return [
    {
      what: `Trace of ${count(ROWS)} rows read and judged`,
      ours: `${own.seconds.toFixed(2)} s, ${count(own.megabytes)} MB`,
      reference: `${reference.seconds.toFixed(2)} s, ${count(reference.megabytes)} MB of a bare split`,
      ratio: own.seconds / reference.seconds,
      goal: `${GOAL_S} s at most`,
      isMet: own.seconds <= GOAL_S,
    },
  ];
}

/** The reader runs on phones only, so the build of the server leaves it out. */
async function compileReader() {
  const command = ['node_modules/typescript/bin/tsc', '-p', 'backend/scripts/bench/logger.tsconfig.json'];
  const { code, output } = await runTool(process.execPath, command, { cwd: PROJECT_ROOT });
  if (code !== 0) {
    throw new ScriptFailure(`The reader of logger files does not compile:\n${output.trim()}`);
  }
}

/**
 * A box that comes down in eight hours and stays there, with a second probe and a pressure: made without chance, so that
 * two runs read the same bytes.
 */
function trace() {
  const lines = ['Data logger,box 7', 'Time,Air (°F),Product (°F),Suction (psig)'];
  const begin = Date.UTC(2026, 10, 20, 6);
  for (let row = 0; row < ROWS; row += 1) {
    const seconds = row * EVERY_S;
    const cooling = Math.max(1 - seconds / 28_800, 0);
    const air = 36 + 40 * cooling + Math.sin(row / 900) + 0.3 * Math.sin(row * 1.7);
    const product = 37 + 39 * cooling + 0.4 * Math.sin(row / 1500);
    const pressure = 55 + 2 * Math.sin(row / 70);
    const at = new Date(begin + seconds * 1000).toISOString().slice(0, 19).replace('T', ' ');
    lines.push(`${at},${air.toFixed(1)},${product.toFixed(1)},${pressure.toFixed(2)}`);
  }
  return lines.join('\n');
}

/**
 * @typedef {object} Round
 * @property {number} seconds
 * @property {number} bytes that the thread's heap and buffers had grown by at the end
 * @property {string} outcome
 */

/**
 * @param {'ours' | 'bare'} what
 * @param {string} text
 * @returns {Promise<Round>} of a fresh thread, as a phone starts one for each file
 */
function inThread(what, text) {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./logger-worker.mjs', import.meta.url), {
      workerData: { what, text },
    });
    worker.once('message', resolve);
    worker.once('error', reject);
  });
}
