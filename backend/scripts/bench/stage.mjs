import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import mysql from 'mysql2/promise';
import { startInbox } from '../inbox.mjs';
import { startMariadb } from '../mariadb.mjs';
import { startObjectStore } from '../object-store.mjs';
import { anyFreePort } from '../ports.mjs';
import { spawnPart, signalProcess, stopProcess } from '../processes.mjs';
import { loadSecrets } from '../secrets.mjs';
import { BUCKET, serverEnvironment } from '../server-environment.mjs';
import { startServer, waitUntilHealthy } from '../server-process.mjs';
import { createThrowAwayDirectory, removeThrowAwayDirectory } from '../throw-away.mjs';

const BARE_DATABASE = 'bench_bare';

/**
 * @typedef {import('../shutdown.mjs').Shutdown} Shutdown
 * @typedef {object} Stage
 * @property {string} dataDir removed at the end
 * @property {Record<string, string>} environment what the server was told
 * @property {import('../mariadb.mjs').RunningMariadb} mariadb
 * @property {number} port of the product's server
 * @property {number} serverPid
 */

/**
 * Starts the product with nothing in it, on a folder of its own. The database flushes at every commit, as it
 * does in use: both sides of a comparison pay for it.
 * @param {Shutdown} shutdown every part is noted there as soon as it lives
 * @param {{ profileDir: string | undefined }} options where the server writes a CPU profile when it ends
 * @returns {Promise<Stage>}
 */
export async function setStage(shutdown, { profileDir }) {
  const { log } = shutdown;
  const dataDir = createThrowAwayDirectory();
  shutdown.add('The folder', () => removeThrowAwayDirectory(dataDir));
  const secrets = loadSecrets(dataDir);
  const mariadb = await startMariadb({ dataDir, log });
  shutdown.add('MariaDB', mariadb.stop, mariadb.kill);
  shutdown.check();
  const objectStore = await startObjectStore({
    dataDir,
    accessKeyId: secrets.s3AccessKeyId,
    buckets: [BUCKET],
  });
  shutdown.add('The object store', objectStore.close);
  const inbox = await startInbox({ dataDir });
  shutdown.add('The inbox', inbox.close);
  const port = await anyFreePort();
  const localUrl = `http://127.0.0.1:${port}`;
  const address = { host: '127.0.0.1', port, publicUrl: localUrl, localUrl };
  const environment = {
    ...serverEnvironment({ dataDir, address, secrets, mariadb, objectStore, inbox }),
    SEED_DEMO: '0',
    LOG_LEVEL: 'warn',
    TLS_CERT: '',
    TLS_KEY: '',
  };
  const profiler = new URL('./profiler.mjs', import.meta.url).href;
  const profiling = profileDir ? { NODE_OPTIONS: `--import=${profiler}`, BENCH_PROFILE_DIR: profileDir } : {};
  const server = startServer({ environment: { ...environment, ...profiling }, dataDir });
  shutdown.add('The server', server.stop, server.kill);
  await waitUntilHealthy(server, localUrl, { log, isStopped: () => shutdown.isRequested });
  shutdown.check();
  void server.exited.then((how) => {
    if (shutdown.parts.length > 0 && !shutdown.isRequested)
      log(`  The server ended (${how}):\n${server.lastWords()}`);
  });
  return { dataDir, environment, mariadb, port, serverPid: /** @type {number} */ (server.pid) };
}

/**
 * Starts the bare route in a process of its own, on the same database server.
 * @param {Stage} stage
 * @param {readonly string[]} sequenceIds the rows that it counts in
 * @param {Shutdown} shutdown
 * @returns {Promise<number>} its port
 */
export async function startBareServer({ mariadb }, sequenceIds, shutdown) {
  const { host, port } = mariadb;
  await createBareTables(mariadb, sequenceIds);
  const file = new URL('./bare-server.mjs', import.meta.url).pathname;
  const { child, exited } = spawnPart(process.execPath, [file], {
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      BENCH_HOST: host,
      BENCH_PORT: String(port),
      BENCH_USER: mariadb.root.user,
      BENCH_PASSWORD: mariadb.root.password,
      BENCH_DATABASE: BARE_DATABASE,
    },
  });
  const stop = () => stopProcess(child.pid, 5_000);
  shutdown.add('The bare server', stop, () => void signalProcess(child.pid, 'SIGKILL'));
  return new Promise((resolve, reject) => {
    child.once('message', (message) => resolve(/** @type {{ port: number }} */ (message).port));
    void exited.then((how) => reject(new Error(`The bare server ended: ${how}`)));
  });
}

/**
 * @param {Stage['mariadb']} mariadb
 * @param {readonly string[]} sequenceIds
 */
async function createBareTables(mariadb, sequenceIds) {
  const connection = await mysql.createConnection({
    host: mariadb.host,
    port: mariadb.port,
    ...mariadb.root,
  });
  try {
    await connection.query(`CREATE DATABASE ${BARE_DATABASE}`);
    await connection.query(`USE ${BARE_DATABASE}`);
    await connection.query(
      'CREATE TABLE bare_sequence (id UUID PRIMARY KEY, head_position INT NOT NULL, head_hash CHAR(64) NOT NULL)',
    );
    await connection.query(
      `CREATE TABLE bare_entry (id UUID PRIMARY KEY, sequence_id UUID NOT NULL, author_id UUID NOT NULL,
         device_id UUID NOT NULL, device_count INT NOT NULL, received_at DATETIME(3) NOT NULL, body LONGTEXT NOT NULL,
         body_hash CHAR(64) NOT NULL, server_part LONGTEXT NOT NULL, previous_hash CHAR(64) NOT NULL,
         hash CHAR(64) NOT NULL)`,
    );
    await connection.query('INSERT INTO bare_sequence (id, head_position, head_hash) VALUES ?', [
      sequenceIds.map((id) => [id, 0, '0'.repeat(64)]),
    ]);
  } finally {
    await connection.end();
  }
}

/**
 * What this ran on, without naming anybody's machine.
 * @param {string} dataDir
 * @returns {string}
 */
export function describeMachine(dataDir) {
  const gigabytes = (os.totalmem() / 1024 ** 3).toFixed(0);
  const [load = 0] = os.loadavg();
  const memoryDisk = fs.statfsSync(dataDir).type === 0x01021994 ? ', data in memory (tmpfs)' : '';
  const system = `${os.type()}, Node ${process.versions.node}`;
  return `${os.cpus().length} cores, ${gigabytes} GB, ${system}${memoryDisk}; load average ${load.toFixed(1)} at the end`;
}

/**
 * Resident memory of a process.
 * @param {number} pid
 * @returns {number} in bytes
 */
export function residentBytes(pid) {
  const status = fs.readFileSync(path.join('/proc', String(pid), 'status'), 'utf8');
  return Number(/^VmRSS:\s+(\d+) kB$/m.exec(status)?.[1]) * 1024;
}
