import fs from 'node:fs';
import path from 'node:path';
import { writeBrotliTwins } from './brotli-twins.mjs';
import { describeFailure, ScriptFailure } from './failure.mjs';
import { waitForLock } from './lock.mjs';
import { isCommand, PROJECT_ROOT } from './paths.mjs';
import { runTool } from './processes.mjs';
import { removeStaleOutput } from './stale-output.mjs';
import { hashSources } from './source-hash.mjs';

/**
 * @typedef {object} BuildPart
 * @property {string} name as shown to people
 * @property {string[]} sources files and folders that decide the result
 * @property {string} proof a file that the build makes: without it a stamp means nothing
 * @property {string[]} command for Node
 * @property {() => Promise<void>} finish what follows the tool
 */

const COMMON_SOURCES = [
  'shared',
  'package.json',
  'package-lock.json',
  ...fs.readdirSync(PROJECT_ROOT).filter((name) => /^tsconfig.*\.json$/.test(name)),
];
const BROWSER_FILES = path.join(PROJECT_ROOT, 'dist', 'frontend', 'browser');

/** @type {BuildPart[]} */
const PARTS = [
  {
    name: 'backend',
    sources: [...COMMON_SOURCES, 'backend'],
    proof: 'dist/backend/src/main.js',
    command: ['node_modules/typescript/bin/tsc', '-p', 'backend'],
    finish: async () => removeStaleOutput(PROJECT_ROOT, ['backend', 'shared']),
  },
  {
    name: 'frontend',
    sources: [...COMMON_SOURCES, 'frontend', 'angular.json'],
    proof: 'dist/frontend/browser/index.html',
    command: ['node_modules/@angular/cli/bin/ng.js', 'build', '--configuration', 'production'],
    finish: () => writeBrotliTwins(BROWSER_FILES),
  },
];

/**
 * Builds what changed since the last time, both parts at once. One build at a time: a second one, from
 * another terminal, waits and then finds everything done.
 * @param {{ log?: (line: string) => void, force?: boolean }} [options] `force` builds even what did not change
 * @returns {Promise<string[]>} the names of the parts that were built
 * @throws {ScriptFailure} with what the tool printed
 */
export async function build({ log = console.log, force = false } = {}) {
  const dist = path.join(PROJECT_ROOT, 'dist');
  fs.mkdirSync(dist, { recursive: true });
  const lock = await waitForLock(path.join(dist, '.build-lock'), (pid) =>
    log(`  Waiting for another build (process ${pid}) …`),
  );
  try {
    const results = await Promise.allSettled(PARTS.map((part) => buildPart(part, dist, force, log)));
    const failures = results.flatMap((result) => (result.status === 'rejected' ? [result.reason] : []));
    if (failures.length > 0) {
      throw failures.length === 1
        ? failures[0]
        : new ScriptFailure(failures.map(describeFailure).join('\n\n'));
    }
    const isBuilt = results.map((result) => result.status === 'fulfilled' && result.value);
    return PARTS.filter((_, index) => isBuilt[index]).map((part) => part.name);
  } finally {
    lock.release();
  }
}

/**
 * @param {BuildPart} part
 * @param {string} dist
 * @param {boolean} force
 * @param {(line: string) => void} log
 * @returns {Promise<boolean>} whether there was anything to do
 */
async function buildPart(part, dist, force, log) {
  const stampFile = path.join(dist, `.${part.name}-stamp`);
  const wanted = hashSources(PROJECT_ROOT, part.sources, part.command);
  const known = fs.existsSync(stampFile) ? fs.readFileSync(stampFile, 'utf8') : '';
  if (!force && known === wanted && fs.existsSync(path.join(PROJECT_ROOT, part.proof))) {
    return false;
  }
  fs.rmSync(stampFile, { force: true });
  const begin = performance.now();
  const { code, output } = await runTool(process.execPath, part.command, {
    cwd: PROJECT_ROOT,
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
  });
  if (code !== 0 || !fs.existsSync(path.join(PROJECT_ROOT, part.proof))) {
    throw new ScriptFailure(`The ${part.name} does not build:\n${output.trim()}`);
  }
  await part.finish();
  // The hash from before the build: a file saved meanwhile makes the next build run again.
  fs.writeFileSync(stampFile, wanted);
  log(`  Built the ${part.name} (${((performance.now() - begin) / 1000).toFixed(1)} s)`);
  return true;
}

if (isCommand(import.meta.url)) {
  const { ensureDependencies } = await import('./deps.mjs');
  try {
    await ensureDependencies();
    const built = await build({ force: process.argv.includes('--force') });
    console.log(built.length === 0 ? 'Nothing changed since the last build.' : 'Done.');
  } catch (error) {
    console.error(describeFailure(error));
    process.exitCode = 1;
  }
}
