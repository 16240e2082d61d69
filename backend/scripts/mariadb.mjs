import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import mysql from 'mysql2/promise';
import { DATABASE_PACKAGES, ensureSystemPackages, findCommand } from './debian.mjs';
import { ScriptFailure } from './failure.mjs';
import { accountStatements, DATABASE_NAME, ROOT_USER, OWNER_USER, APP_USER } from './mariadb-accounts.mjs';
import { installDataDirectory, serverUser } from './mariadb-install.mjs';
import { lastLines, makeWalkableDirectory, rotateLog, shortHash } from './paths.mjs';
import { isAlive, signalProcess, spawnPart, stopProcess } from './processes.mjs';
import { readPorts, rememberedPort } from './ports.mjs';
import { loadSecrets } from './secrets.mjs';
import { createThrowAwayDirectory, removeThrowAwayDirectory } from './throw-away.mjs';

const HOST = '127.0.0.1';

/**
 * A crash leaves the log to be replayed, which takes longer than a start; longer than this is broken.
 */
const START_PATIENCE_MS = 300_000;

/** Flushing a large buffer pool takes a while, and killing it would only postpone the work. */
const STOP_PATIENCE_MS = 120_000;

/**
 * @typedef {{ user: string, password: string }} Account
 * @typedef {object} RunningMariadb
 * @property {string} host always loopback
 * @property {number} port
 * @property {string} version
 * @property {string} database the product's database, present and empty at first
 * @property {Account} root may do everything; for tests and this script only
 * @property {Account} owner owns the database: migrations run as this
 * @property {Account} app may do what the migrations granted: the server works as this
 * @property {boolean} reused whether a server that an earlier start left behind was taken over
 * @property {Promise<string>} exited resolves with the way it ended, when it ends
 * @property {() => Promise<void>} stop
 * @property {() => void} kill
 */

/**
 * Starts MariaDB on the data directory, and makes the database and its accounts. The server listens on
 * loopback only, on a free port; it runs as an unprivileged user when we are root.
 * @param {object} [options]
 * @param {string} [options.dataDir] where to keep everything; a throw-away server makes its own folder
 * @param {boolean} [options.throwAway] for tests: quick and forgetful, everything is removed on stop
 * @param {(line: string) => void} [options.log]
 * @returns {Promise<RunningMariadb>}
 * @throws {ScriptFailure} when it can't be installed or doesn't come up
 */
export async function startMariadb({ dataDir, throwAway = false, log = () => {} } = {}) {
  ensureSystemPackages(DATABASE_PACKAGES, log);
  const home = dataDir ?? createThrowAwayDirectory();
  makeWalkableDirectory(home);
  const secrets = loadSecrets(home);
  const files = serverFiles(home);
  const leftover = await adoptLeftover(home, files, secrets, log);
  if (leftover) {
    return leftover;
  }
  const user = serverUser(files.data);
  await installDataDirectory(files.data, user);
  rotateLog(files.log);
  const initSql = path.join(files.data, 'accounts.sql');
  fs.writeFileSync(initSql, accountStatements(secrets, { testDatabases: throwAway }), { mode: 0o600 });
  if (user) {
    fs.chownSync(initSql, user.uid, user.gid);
  }
  try {
    const { port, child, exited, version } = await launch({ home, files, user, initSql, throwAway, secrets });
    const stop = async () => {
      await stopProcess(child.pid, STOP_PATIENCE_MS);
      await exited;
      if (dataDir === undefined) {
        removeThrowAwayDirectory(home);
      }
    };
    const kill = () => void signalProcess(child.pid, 'SIGKILL');
    return { ...describeServer(port, version, secrets), reused: false, exited, stop, kill };
  } finally {
    fs.rmSync(initSql, { force: true });
  }
}

/** @param {string} home */
function serverFiles(home) {
  const data = path.join(home, 'mariadb');
  const socket = path.join(data, 'mariadb.sock');
  return {
    data,
    // The kernel cuts socket paths off at about 107 bytes.
    socket:
      Buffer.byteLength(socket) > 100 ? path.join(os.tmpdir(), `firstcold-${shortHash(data)}.sock`) : socket,
    pid: path.join(data, 'mariadb.pid'),
    log: path.join(data, 'mariadb.log'),
  };
}

/**
 * Starts the server on a free port; tries other ports when somebody takes the port in between.
 * @param {object} setup
 * @param {string} setup.home
 * @param {ReturnType<typeof serverFiles>} setup.files
 * @param {import('./mariadb-install.mjs').SystemUser | undefined} setup.user
 * @param {string} setup.initSql
 * @param {boolean} setup.throwAway
 * @param {import('./secrets.mjs').Secrets} setup.secrets
 */
async function launch({ home, files, user, initSql, throwAway, secrets }) {
  const command = /** @type {string} */ (findCommand(DATABASE_PACKAGES[0].commands[0]));
  for (let attempt = 1; ; attempt += 1) {
    const port = await rememberedPort(home, 'mariadb');
    const logStart = fs.statSync(files.log, { throwIfNoEntry: false })?.size ?? 0;
    const part = spawnPart(command, serverFlags({ files, user, port, initSql, throwAway }));
    const outcome = await waitUntilReady(port, secrets, part.exited);
    if ('version' in outcome) {
      return { ...part, port, version: outcome.version };
    }
    await stopProcess(part.child.pid, 10_000);
    const lines = lastLines(files.log, { fromByte: logStart });
    if (attempt < 4 && lines.some((line) => line.includes('Address already in use'))) {
      continue;
    }
    throw new ScriptFailure(`MariaDB did not start (${outcome.problem}). Its log ends:\n${lines.join('\n')}`);
  }
}

/**
 * @param {object} setup
 * @param {ReturnType<typeof serverFiles>} setup.files
 * @param {import('./mariadb-install.mjs').SystemUser | undefined} setup.user
 * @param {number} setup.port
 * @param {string} setup.initSql
 * @param {boolean} setup.throwAway
 * @returns {string[]} `--no-defaults` comes first and keeps the system's own settings out
 */
function serverFlags({ files, user, port, initSql, throwAway }) {
  return [
    '--no-defaults',
    ...(user ? [`--user=${user.name}`] : []),
    `--datadir=${files.data}`,
    `--socket=${files.socket}`,
    `--pid-file=${files.pid}`,
    `--log-error=${files.log}`,
    `--init-file=${initSql}`,
    `--bind-address=${HOST}`,
    `--port=${port}`,
    '--skip-name-resolve',
    '--local-infile=0',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    '--innodb-log-file-size=16M',
    '--max-connections=200',
    ...(throwAway
      ? ['--innodb-flush-log-at-trx-commit=0', '--skip-innodb-doublewrite']
      : ['--innodb-flush-log-at-trx-commit=1', '--innodb-buffer-pool-size=256M']),
  ];
}

/**
 * Waits until the server answers, ends, or takes too long.
 * @param {number} port
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {Promise<string>} exited
 * @returns {Promise<{ version: string } | { problem: string }>}
 */
async function waitUntilReady(port, secrets, exited) {
  const deadline = Date.now() + START_PATIENCE_MS;
  let ended = /** @type {string | undefined} */ (undefined);
  void exited.then((how) => (ended = how));
  while (Date.now() < deadline) {
    const version = await ping(port, secrets);
    // The order matters: an answer after our server ended came from somebody else on that port.
    if (ended !== undefined) {
      return { problem: `it ended with ${ended}` };
    }
    if (version !== undefined) {
      return { version };
    }
    await sleep(60);
  }
  return { problem: `it did not answer within ${START_PATIENCE_MS / 1000} s` };
}

/**
 * @param {number} port
 * @param {import('./secrets.mjs').Secrets} secrets
 * @returns {Promise<string | undefined>} its version, or undefined while it doesn't let us in
 */
async function ping(port, secrets) {
  try {
    const connection = await mysql.createConnection({
      host: HOST,
      port,
      user: ROOT_USER,
      password: secrets.databaseRootPassword,
      connectTimeout: 2000,
    });
    const [rows] = await connection.query('SELECT VERSION() AS version');
    await connection.end();
    return /** @type {{ version: string }[]} */ (rows)[0].version.replace(/-.*/, '');
  } catch {
    // Not listening yet, still replaying its log, or not ours: the caller keeps time.
    return undefined;
  }
}

/**
 * Takes over a server on this data directory whose script was killed, instead of failing on the files
 * that it holds. A pid file of a process that is gone is removed.
 * @param {string} home
 * @param {ReturnType<typeof serverFiles>} files
 * @param {import('./secrets.mjs').Secrets} secrets
 * @param {(line: string) => void} log
 * @returns {Promise<RunningMariadb | undefined>}
 */
async function adoptLeftover(home, files, secrets, log) {
  const pid = fs.existsSync(files.pid) ? Number(fs.readFileSync(files.pid, 'utf8').trim()) : 0;
  if (!(pid > 0) || !isAlive(pid) || !isServerOf(pid, files.data)) {
    fs.rmSync(files.pid, { force: true });
    return undefined;
  }
  const port = readPorts(home).mariadb;
  const version = port === undefined ? undefined : await ping(port, secrets);
  if (port === undefined || version === undefined) {
    throw new ScriptFailure(
      `A MariaDB server (process ${pid}) already works on ${files.data} and does not let us in: stop it with \`kill ${pid}\`, then try again.`,
    );
  }
  log(`  Taking over the MariaDB server that an earlier start left behind (process ${pid})`);
  const stop = () => stopProcess(pid, STOP_PATIENCE_MS);
  const kill = () => void signalProcess(pid, 'SIGKILL');
  return { ...describeServer(port, version, secrets), reused: true, exited: waitForEnd(pid), stop, kill };
}

/**
 * Whether a process is a server on this data directory; ids get reused, also by other MariaDB servers.
 * @param {number} pid
 * @param {string} data
 */
function isServerOf(pid, data) {
  const commandLine = `/proc/${pid}/cmdline`;
  if (!fs.existsSync('/proc/self/cmdline')) {
    return true;
  }
  return fs.existsSync(commandLine) && fs.readFileSync(commandLine, 'utf8').includes(`--datadir=${data}\0`);
}

/** @param {number} pid a process that is not our child can only be watched */
async function waitForEnd(pid) {
  while (isAlive(pid)) {
    await sleep(500, undefined, { ref: false });
  }
  return 'unknown exit';
}

/**
 * @param {number} port
 * @param {string} version
 * @param {import('./secrets.mjs').Secrets} secrets
 */
function describeServer(port, version, secrets) {
  return {
    host: HOST,
    port,
    version,
    database: DATABASE_NAME,
    root: { user: ROOT_USER, password: secrets.databaseRootPassword },
    owner: { user: OWNER_USER, password: secrets.databaseOwnerPassword },
    app: { user: APP_USER, password: secrets.databaseAppPassword },
  };
}
