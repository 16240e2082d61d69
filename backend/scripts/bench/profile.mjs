import fs from 'node:fs';
import path from 'node:path';
import { PROJECT_ROOT } from '../paths.mjs';

const LINES = 25;

/**
 * The functions that took the most time of their own in the server's CPU profiles, of all its threads.
 * @param {string} folder
 * @returns {string[]} lines to print; places are in the compiled files
 */
export function describeProfiles(folder) {
  const costs = /** @type {Map<string, number>} */ (new Map());
  let busyMicros = 0;
  for (const file of fs.readdirSync(folder).filter((name) => name.endsWith('.cpuprofile'))) {
    const { nodes, samples, timeDeltas } = JSON.parse(fs.readFileSync(path.join(folder, file), 'utf8'));
    const byId = new Map(nodes.map((/** @type {any} */ node) => [node.id, describe(node.callFrame)]));
    for (const [index, id] of samples.entries()) {
      const name = byId.get(id) ?? '';
      if (/^\((idle|root)\)/.test(name)) continue;
      costs.set(name, (costs.get(name) ?? 0) + timeDeltas[index]);
      busyMicros += timeDeltas[index];
    }
  }
  return [...costs]
    .sort((a, b) => b[1] - a[1])
    .slice(0, LINES)
    .map(([name, micros]) => `  ${((100 * micros) / busyMicros).toFixed(1).padStart(5)} %  ${name}`);
}

/** @param {{ functionName: string, url: string, lineNumber: number }} frame */
function describe({ functionName, url, lineNumber }) {
  const place = url.replace(/^file:\/\//, '').replace(`${PROJECT_ROOT}/`, '');
  return `${functionName || '(anonymous)'} ${place ? `${place}:${lineNumber + 1}` : ''}`;
}
