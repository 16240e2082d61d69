import fs from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';
import { writeFileAtomically } from './paths.mjs';
import { isSameProcess, processBirth } from './processes.mjs';

/**
 * @typedef {{ pid: number, birth?: string }} NotedProcess
 * @typedef {{ owner: NotedProcess, parts?: Record<string, NotedProcess> }} LockContent
 */

/**
 * A file that says "in use by process n". A lock whose process is gone is taken over, so a crash never
 * needs a person to delete a file.
 * @param {string} file
 * @returns {{ held: NotedProcess } | { lock: Lock, leftover: LockContent | undefined }}
 *   `held` when another process has it; `leftover` is what a process that died had noted
 */
export function takeLock(file) {
  for (;;) {
    const content = { owner: noteProcess(process.pid) };
    if (createLock(file, content)) {
      return { lock: new Lock(file, content), leftover: undefined };
    }
    const found = readLock(file);
    if (found && found.owner.pid !== process.pid && isSameProcess(found.owner)) {
      return { held: found.owner };
    }
    removeStaleLock(file, found);
    if (createLock(file, content)) {
      return { lock: new Lock(file, content), leftover: found };
    }
  }
}

/**
 * Creates the lock complete with its content: a link appears whole or not at all, so nobody can read an
 * empty lock and take it for a broken one.
 * @param {string} file
 * @param {LockContent} content
 * @returns {boolean} false when there is a lock already
 */
function createLock(file, content) {
  const draft = `${file}.${process.pid}.draft`;
  fs.writeFileSync(draft, JSON.stringify(content));
  try {
    fs.linkSync(draft, file);
    return true;
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') {
      return false;
    }
    throw error;
  } finally {
    fs.rmSync(draft, { force: true });
  }
}

/**
 * Removes the lock of a dead process; puts it back when it turns out to be a newer one, made by somebody
 * who found the same stale lock and was quicker.
 * @param {string} file
 * @param {LockContent | undefined} stale
 */
function removeStaleLock(file, stale) {
  const aside = `${file}.${process.pid}.stale`;
  try {
    fs.renameSync(file, aside);
    if (readLock(aside)?.owner.pid !== stale?.owner.pid) {
      fs.linkSync(aside, file);
    }
    fs.rmSync(aside);
  } catch (error) {
    const { code } = /** @type {NodeJS.ErrnoException} */ (error);
    if (code !== 'ENOENT' && code !== 'EEXIST') {
      throw error;
    }
  }
}

/**
 * Waits for a lock as long as it takes; for work that simply has to happen one at a time.
 * @param {string} file
 * @param {(pid: number) => void} [whenWaiting] called once
 * @returns {Promise<Lock>}
 */
export async function waitForLock(file, whenWaiting = () => {}) {
  for (let round = 0; ; round += 1) {
    const result = takeLock(file);
    if ('lock' in result) {
      return result.lock;
    }
    if (round === 0) {
      whenWaiting(result.held.pid);
    }
    await sleep(200);
  }
}

/** @param {number} pid */
function noteProcess(pid) {
  return { pid, birth: processBirth(pid) };
}

/**
 * @param {string} file
 * @returns {LockContent | undefined} undefined when absent or cut off by a crash
 */
function readLock(file) {
  try {
    const content = JSON.parse(fs.readFileSync(file, 'utf8'));
    return typeof content?.owner?.pid === 'number' ? content : undefined;
  } catch {
    return undefined;
  }
}

/** A lock that is held. */
export class Lock {
  /**
   * @param {string} file
   * @param {LockContent} content
   */
  constructor(file, content) {
    this.file = file;
    this.content = content;
  }

  /**
   * Notes a part that would outlive a killed script, so that the next start can find and stop it.
   * @param {string} name
   * @param {number} pid
   */
  note(name, pid) {
    this.content = { ...this.content, parts: { ...this.content.parts, [name]: noteProcess(pid) } };
    writeFileAtomically(this.file, JSON.stringify(this.content));
  }

  /** Lets the next one in. */
  release() {
    fs.rmSync(this.file, { force: true });
  }
}
