import { parentPort, workerData } from 'node:worker_threads';
import { analysePullDown } from '#shared/refrigeration/logger/pull-down';
import { readLogger } from '#shared/refrigeration/logger/read-logger';
import { toSi } from '#shared/units/convert';
import { kelvin, second } from '#shared/units/quantity';

/*
 * One trace in a thread of its own: read, its air temperature judged on every row; or split by a bare loop.
 */

/** @param {string} text */
function ours(text) {
  const log = readLogger(text);
  if (!log.ok) {
    throw new Error(`The trace is refused: ${log.reason}`);
  }
  const [{ unit, values: written }] = log.columns;
  const values = written.map((value) => toSi(value, unit ?? 'degF'));
  const result = analysePullDown({
    samples: Array.from(log.times, (time, row) => ({ at: second(time), temperature: kelvin(values[row]) })),
    bandLow: null,
    bandHigh: kelvin(toSi(41, 'degF')),
    holdFor: second(86_400),
    longestExcursion: second(1800),
  });
  return { outcome: result.ok ? result.outcome : result.reason, keep: [log, values] };
}

/** @param {string} text */
function bare(text) {
  const lines = text.split('\n');
  const columns = Array.from({ length: 4 }, () => new Float64Array(lines.length));
  lines.forEach((line, row) => {
    line.split(',').forEach((cell, index) => (columns[index][row] = Number(cell)));
  });
  return { outcome: `${lines.length} lines`, keep: [columns] };
}

const used = () => {
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
};
const { what, text } = workerData;
const before = used();
const begin = performance.now();
const { outcome, keep } = what === 'ours' ? ours(text) : bare(text);
const seconds = (performance.now() - begin) / 1000;
parentPort?.postMessage({ seconds, bytes: used() - before, outcome, kept: keep.length });
