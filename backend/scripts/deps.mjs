import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { ScriptFailure } from './failure.mjs';
import { PROJECT_ROOT } from './paths.mjs';
import { runTool } from './processes.mjs';

/*
 * Runs before `npm ci`, so nothing here may import a package.
 */

const LOWEST_NODE = [20, 19];

/**
 * Refuses a Node version that the pinned packages were not chosen for, before npm gives a longer and
 * less clear answer.
 * @param {string} [version]
 */
export function checkNodeVersion(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number);
  if (major !== LOWEST_NODE[0] || minor < LOWEST_NODE[1]) {
    throw new ScriptFailure(`Node ${version} does not fit: Firstcold needs Node 20.19 or a later 20.x.`);
  }
}

/**
 * Makes node_modules match package-lock.json. The stamp inside node_modules names the lock file that
 * it was made from, so an unchanged project starts without asking npm anything.
 * @param {{ log?: (line: string) => void, root?: string }} [options]
 * @returns {Promise<boolean>} whether packages were installed
 */
export async function ensureDependencies({ log = console.log, root = PROJECT_ROOT } = {}) {
  checkNodeVersion();
  const lock = fs.readFileSync(path.join(root, 'package-lock.json'));
  const wanted = createHash('sha1').update(lock).digest('hex');
  const stampFile = path.join(root, 'node_modules', '.firstcold-lock');
  if (fs.existsSync(stampFile) && fs.readFileSync(stampFile, 'utf8') === wanted) {
    return false;
  }
  log('  Installing packages (npm ci), about a minute the first time …');
  const { code, output } = await runTool('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: root,
  });
  if (code !== 0) {
    throw new ScriptFailure(explainNpmFailure(output));
  }
  fs.writeFileSync(stampFile, wanted);
  return true;
}

/**
 * @param {string} output what npm printed
 * @returns {string} the likely cause first, npm's own last lines after it
 */
export function explainNpmFailure(output) {
  const tail = output.trim().split('\n').slice(-12).join('\n');
  let cause = 'npm ci failed.';
  if (/ENOTFOUND|EAI_AGAIN|ETIMEDOUT|ECONNREFUSED|ECONNRESET|ENETUNREACH|network/i.test(output)) {
    cause =
      'Packages could not be fetched: the package registry is not reachable. Check the network, then try again.';
  } else if (/EUSAGE|in sync/i.test(output)) {
    cause = 'package.json and package-lock.json disagree: run `npm install` and commit the lock file.';
  } else if (/EBADENGINE/.test(output) && /engine-strict|notsup/i.test(output)) {
    cause = 'A package refuses this Node version: use Node 20.19 or a later 20.x.';
  } else if (/EACCES|EPERM|EROFS/.test(output)) {
    cause = 'npm may not write into node_modules: check who owns the project folder.';
  } else if (/ENOSPC/.test(output)) {
    cause = 'The disk is full.';
  }
  return `${cause}\n${tail}`;
}
