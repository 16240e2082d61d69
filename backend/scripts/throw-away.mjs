import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { isAlive, isSameProcess, processBirth, signalProcess } from './processes.mjs';

const PREFIX = 'firstcold-test-';

/**
 * A folder in the temp folder for one test run. Folders of runs that were killed are removed first, with
 * the database servers that still work in them: nobody else would.
 * @returns {string}
 */
export function createThrowAwayDirectory() {
  for (const entry of fs.readdirSync(os.tmpdir())) {
    if (entry.startsWith(PREFIX)) {
      sweep(path.join(os.tmpdir(), entry));
    }
  }
  const directory = fs.mkdtempSync(path.join(os.tmpdir(), PREFIX));
  fs.chmodSync(directory, 0o711);
  const owner = { pid: process.pid, birth: processBirth(process.pid) };
  fs.writeFileSync(path.join(directory, 'owner.json'), JSON.stringify(owner));
  return directory;
}

/** @param {string} directory */
export function removeThrowAwayDirectory(directory) {
  fs.rmSync(directory, { recursive: true, force: true, maxRetries: 5, retryDelay: 100 });
}

/**
 * Removes a folder whose run is dead. A folder without a readable owner is left alone: its run may be
 * about to write it, or it belongs to another user.
 * @param {string} directory
 */
function sweep(directory) {
  try {
    const owner = JSON.parse(fs.readFileSync(path.join(directory, 'owner.json'), 'utf8'));
    if (isSameProcess(owner)) {
      return;
    }
    const pidFile = path.join(directory, 'mariadb', 'mariadb.pid');
    const pid = fs.existsSync(pidFile) ? Number(fs.readFileSync(pidFile, 'utf8')) : 0;
    if (pid > 0 && isAlive(pid) && commandLine(pid).includes(`--datadir=${directory}`)) {
      signalProcess(pid, 'SIGKILL');
    }
    removeThrowAwayDirectory(directory);
  } catch {
    // Not ours to remove, or another run is sweeping it at the same moment.
  }
}

/** @param {number} pid */
function commandLine(pid) {
  const file = `/proc/${pid}/cmdline`;
  return fs.existsSync(file) ? fs.readFileSync(file, 'utf8') : '';
}
