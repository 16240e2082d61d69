import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The root of the project, whatever the current directory is. */
export const PROJECT_ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..', '..');

/**
 * Where everything that an installation keeps lies: database, photos, mails, secrets, logs.
 * @returns {string} an absolute path
 */
export function dataDirectory() {
  return path.resolve(process.env.DATA_DIR || path.join(PROJECT_ROOT, '.data'));
}

/**
 * Whether a module was started as a command (`node x.mjs`) rather than imported.
 * Links are resolved, because npm and temporary folders are full of them.
 * @param {string} moduleUrl `import.meta.url` of the module
 * @returns {boolean}
 */
export function isCommand(moduleUrl) {
  const started = process.argv[1];
  if (!started || !fs.existsSync(started)) {
    return false;
  }
  return fs.realpathSync(started) === fs.realpathSync(fileURLToPath(moduleUrl));
}

/**
 * A folder that others on this machine may walk through but not list: the database runs as another
 * user and has to reach its own folder inside.
 * @param {string} directory
 */
export function makeWalkableDirectory(directory) {
  if (!fs.existsSync(directory)) {
    fs.mkdirSync(directory, { recursive: true });
    fs.chmodSync(directory, 0o711);
  }
}

/**
 * Makes a folder only its owner may enter.
 * @param {string} directory
 * @returns {string} the same path
 */
export function makePrivateDirectory(directory) {
  fs.mkdirSync(directory, { recursive: true, mode: 0o700 });
  return directory;
}

/**
 * Puts a log aside under `<name>.1` when it has grown past the limit, so that logs stay bounded
 * to twice that size.
 * @param {string} file
 * @param {number} [limitBytes]
 */
export function rotateLog(file, limitBytes = 20 * 1024 * 1024) {
  const size = fs.statSync(file, { throwIfNoEntry: false })?.size ?? 0;
  if (size > limitBytes) {
    fs.renameSync(file, `${file}.1`);
  }
}

/**
 * The last lines of a file, starting not before an offset.
 * @param {string} file
 * @param {{ lines?: number, fromByte?: number }} [options]
 * @returns {string[]} empty when there is no such file
 */
export function lastLines(file, { lines = 15, fromByte = 0 } = {}) {
  const size = fs.statSync(file, { throwIfNoEntry: false })?.size ?? 0;
  const start = Math.max(fromByte, size - 64 * 1024);
  if (size <= start) {
    return [];
  }
  const buffer = Buffer.alloc(size - start);
  const handle = fs.openSync(file, 'r');
  try {
    fs.readSync(handle, buffer, 0, buffer.length, start);
  } finally {
    fs.closeSync(handle);
  }
  return buffer.toString('utf8').trimEnd().split('\n').slice(-lines);
}

/**
 * Writes a file so that a crash leaves either the old or the new content, never half of one.
 * @param {string} file
 * @param {string} content
 * @param {number} [mode]
 */
export function writeFileAtomically(file, content, mode = 0o644) {
  const temporary = `${file}.${process.pid}.tmp`;
  const handle = fs.openSync(temporary, 'w', mode);
  try {
    fs.writeSync(handle, content);
    fs.fsyncSync(handle);
  } finally {
    fs.closeSync(handle);
  }
  fs.renameSync(temporary, file);
}

/**
 * A short name for a path, for places where the path itself is too long.
 * @param {string} text
 * @returns {string}
 */
export function shortHash(text) {
  return createHash('sha1').update(text).digest('hex').slice(0, 12);
}
