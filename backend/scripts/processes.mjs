import { spawn } from 'node:child_process';
import fs from 'node:fs';
import { setTimeout as sleep } from 'node:timers/promises';

/** @type {Set<import('node:child_process').ChildProcess>} short-lived children that an interrupt has to end */
const running = new Set();

/**
 * Whether a process with this id lives (a process of another user counts).
 * @param {number} pid
 * @returns {boolean}
 */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return /** @type {NodeJS.ErrnoException} */ (error).code === 'EPERM';
  }
}

/**
 * When a process began, in the kernel's ticks: tells a process from a later one that was given the same
 * id. Undefined when the process is gone or the system has no /proc.
 * @param {number} pid
 * @returns {string | undefined}
 */
export function processBirth(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name in parentheses may hold spaces, so count from its end: state is field 3, the birth field 22.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? undefined : fields[19];
  } catch {
    // Gone, or no /proc.
    return undefined;
  }
}

/**
 * Whether the process that was noted down still lives, rather than a stranger under its id.
 * @param {{ pid: number, birth?: string }} noted
 * @returns {boolean}
 */
export function isSameProcess({ pid, birth }) {
  if (!isAlive(pid)) {
    return false;
  }
  return birth === undefined || !fs.existsSync('/proc/self/stat') || processBirth(pid) === birth;
}

/**
 * Starts a long-running part in its own process group, so that Ctrl-C in the terminal reaches only the
 * script, which then stops the parts in the right order.
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions} [options]
 * @returns {{ child: import('node:child_process').ChildProcess, exited: Promise<string> }}
 *   `exited` tells how it ended ("exit code 1", "SIGKILL")
 */
export function spawnPart(command, args, options = {}) {
  const child = spawn(command, args, { stdio: 'ignore', ...options, detached: true });
  const exited = new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('exit', (code, signal) => resolve(signal ?? `exit code ${code}`));
  });
  return { child, exited };
}

/**
 * Asks a process to end, and ends it when it has not done so in time.
 * @param {number | undefined} pid
 * @param {number} patienceMs
 */
export async function stopProcess(pid, patienceMs) {
  if (pid === undefined || !signalProcess(pid, 'SIGTERM')) {
    return;
  }
  const deadline = Date.now() + patienceMs;
  while (processExists(pid)) {
    if (Date.now() > deadline) {
      signalProcess(pid, 'SIGKILL');
    }
    await sleep(50);
  }
}

/**
 * Sends a signal without complaining about a process that has just ended.
 * @param {number | undefined} pid
 * @param {NodeJS.Signals} signal
 * @returns {boolean} whether there was such a process
 */
export function signalProcess(pid, signal) {
  try {
    return pid !== undefined && process.kill(pid, signal);
  } catch {
    // Already gone.
    return false;
  }
}

/** @param {number} pid a dead child that nobody has collected yet is gone for our purposes */
function processExists(pid) {
  return isAlive(pid) && (!fs.existsSync('/proc/self/stat') || processBirth(pid) !== undefined);
}

/**
 * Runs a tool to its end and collects what it prints.
 * @param {string} command
 * @param {string[]} args
 * @param {import('node:child_process').SpawnOptions} [options] `stdio: 'inherit'` shows instead of collecting
 * @returns {Promise<{ code: number, output: string }>} a tool ended by a signal has code 1
 */
export function runTool(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options, detached: true });
    const pieces = /** @type {Buffer[]} */ ([]);
    running.add(child);
    child.stdout?.on('data', (piece) => pieces.push(piece));
    child.stderr?.on('data', (piece) => pieces.push(piece));
    child.once('error', (error) => resolve({ code: 1, output: error.message }));
    child.once('close', (code) => {
      running.delete(child);
      resolve({ code: code ?? 1, output: Buffer.concat(pieces).toString('utf8') });
    });
  });
}

/**
 * Ends the tools that run at the moment, with everything they started.
 * @param {NodeJS.Signals} [signal]
 */
export function endRunningTools(signal = 'SIGTERM') {
  for (const child of running) {
    signalProcess(child.pid === undefined ? undefined : -child.pid, signal);
  }
}
