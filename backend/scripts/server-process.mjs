import fs from 'node:fs';
import http from 'node:http';
import https from 'node:https';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { ScriptFailure } from './failure.mjs';
import { lastLines, makePrivateDirectory, PROJECT_ROOT, rotateLog } from './paths.mjs';
import { signalProcess, spawnPart, stopProcess } from './processes.mjs';

export const SERVER_FILE = path.join('dist', 'backend', 'src', 'main.js');

const READY_PATIENCE_MS = 120_000;

/** Open uploads and event streams get this long to end by themselves. */
const STOP_PATIENCE_MS = 20_000;

/**
 * Starts the product's server; what it logs goes to a file.
 * @param {object} options
 * @param {Record<string, string>} options.environment
 * @param {string} options.dataDir
 */
export function startServer({ environment, dataDir }) {
  const logFile = path.join(makePrivateDirectory(path.join(dataDir, 'logs')), 'server.log');
  rotateLog(logFile);
  const logStart = fs.statSync(logFile, { throwIfNoEntry: false })?.size ?? 0;
  // The file itself, not a pipe: what the server says last is kept even when we are gone.
  const log = fs.openSync(logFile, 'a', 0o600);
  const { child, exited } = spawnPart(process.execPath, ['--enable-source-maps', SERVER_FILE], {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...environment },
    stdio: ['ignore', log, log],
  });
  fs.closeSync(log);
  return {
    pid: child.pid,
    exited,
    logFile,
    lastWords: () => lastLines(logFile, { fromByte: logStart }).map(readableLogLine).join('\n'),
    stop: () => stopProcess(child.pid, STOP_PATIENCE_MS),
    kill: () => void signalProcess(child.pid, 'SIGKILL'),
  };
}

/**
 * Waits until the server says that it is healthy, and passes on why it is not yet.
 * @param {ReturnType<typeof startServer>} server
 * @param {string} localUrl
 * @param {{ log: (line: string) => void, isStopped: () => boolean }} options
 * @throws {ScriptFailure} with the end of the log when it ends or takes too long
 */
export async function waitUntilHealthy(server, localUrl, { log, isStopped }) {
  const deadline = Date.now() + READY_PATIENCE_MS;
  let ended = /** @type {string | undefined} */ (undefined);
  let shownReason = '';
  void server.exited.then((how) => (ended = how));
  while (Date.now() < deadline && !isStopped()) {
    if (ended !== undefined) {
      throw new ScriptFailure(
        `The server ended while starting (${ended}). Its log ends:\n${server.lastWords()}`,
      );
    }
    const { status, reason } = await askHealth(`${localUrl}/api/health`);
    if (status === 200 && ended === undefined) {
      return;
    }
    if (status === 503 && reason !== shownReason) {
      log(`  Waiting: ${reason}`);
      shownReason = reason;
    }
    await sleep(100);
  }
  if (!isStopped()) {
    const seconds = READY_PATIENCE_MS / 1000;
    throw new ScriptFailure(
      `The server was not ready after ${seconds} s. Its log ends:\n${server.lastWords()}`,
    );
  }
}

/**
 * @param {string} url
 * @returns {Promise<{ status: number, reason: string }>} status 0 while nothing answers
 */
function askHealth(url) {
  const client = url.startsWith('https:') ? https : http;
  return new Promise((resolve) => {
    // The certificate names the public host, and this only asks our own child on this machine.
    const request = client.get(url, { rejectUnauthorized: false, timeout: 3000 }, (response) => {
      const pieces = /** @type {Buffer[]} */ ([]);
      response.on('data', (piece) => pieces.push(piece));
      response.on('error', () => resolve({ status: 0, reason: '' }));
      response.on('end', () =>
        resolve({
          status: response.statusCode ?? 0,
          reason: readReason(Buffer.concat(pieces).toString('utf8')),
        }),
      );
    });
    request.on('timeout', () => request.destroy());
    request.on('error', () => resolve({ status: 0, reason: '' }));
    request.end();
  });
}

/** @param {string} body problem+json, or anything else */
function readReason(body) {
  try {
    const { detail, reason, title } = JSON.parse(body);
    return String(detail ?? reason ?? title ?? body).slice(0, 300);
  } catch {
    // Not JSON: show it as it is.
    return body.slice(0, 300);
  }
}

/**
 * The message and stack out of a line of JSON; other lines, such as a crash of Node itself, stay.
 * @param {string} line
 */
function readableLogLine(line) {
  try {
    const { msg, err } = JSON.parse(line);
    return err?.stack?.includes(msg) ? err.stack : [msg, err?.stack].filter(Boolean).join('\n') || line;
  } catch {
    return line;
  }
}
