import fs from 'node:fs';
import path from 'node:path';
import { build } from './build.mjs';
import { ScriptFailure } from './failure.mjs';
import { startInbox } from './inbox.mjs';
import { takeLock } from './lock.mjs';
import { startMariadb } from './mariadb.mjs';
import { startObjectStore } from './object-store.mjs';
import { PROJECT_ROOT } from './paths.mjs';
import { rememberedPort } from './ports.mjs';
import { isSameProcess, stopProcess } from './processes.mjs';
import { loadSecrets } from './secrets.mjs';
import { BUCKET, serverEnvironment } from './server-environment.mjs';
import { startServer, waitUntilHealthy } from './server-process.mjs';
import { chooseWebAddress } from './web-address.mjs';

/** @typedef {import('./shutdown.mjs').Shutdown} Shutdown */

/**
 * Makes sure that nobody else works on the data directory, and ends a server that a killed start left
 * behind there.
 * @param {string} dataDir
 * @param {Shutdown} shutdown
 */
export async function takeDataDirectory(dataDir, shutdown) {
  const result = takeLock(path.join(dataDir, 'start.lock'));
  if ('held' in result) {
    throw new ScriptFailure(
      `Firstcold already runs on ${dataDir} (process ${result.held.pid}). Stop it first, or set DATA_DIR to another folder.`,
    );
  }
  shutdown.add('The lock', () => result.lock.release());
  shutdown.lock = result.lock;
  const server = result.leftover?.parts?.server;
  if (server && isSameProcess(server)) {
    shutdown.log(`  Stopping a server that an earlier start left behind (process ${server.pid})`);
    await stopProcess(server.pid, 20_000);
  }
}

/**
 * Starts everything in order; each part is noted for the shutdown as soon as it lives.
 * @param {string} dataDir
 * @param {Shutdown} shutdown
 */
export async function startParts(dataDir, shutdown) {
  const { log } = shutdown;
  const secrets = loadSecrets(dataDir);
  const address = await chooseWebAddress(log);

  const mariadb = await timed(log, 'Database', async () => {
    const started = await startMariadb({ dataDir, log });
    shutdown.add('MariaDB', started.stop, started.kill);
    return { ...started, line: `MariaDB ${started.version} on port ${started.port}` };
  });
  shutdown.check();

  const objectStore = await timed(log, 'Storage', async () => {
    const port = await rememberedPort(dataDir, 'objectStore');
    const started = await startObjectStore({
      dataDir,
      port,
      accessKeyId: secrets.s3AccessKeyId,
      buckets: [BUCKET],
    });
    shutdown.add('The object store', started.close);
    return { ...started, line: `local object store on port ${started.port}` };
  });
  const inbox = await timed(log, 'Mail', async () => {
    const port = await rememberedPort(dataDir, 'inbox');
    const started = await startInbox({ dataDir, port, smtpPort: await rememberedPort(dataDir, 'smtp') });
    shutdown.add('The inbox', started.close);
    return { ...started, line: `local inbox on port ${started.port}` };
  });
  shutdown.check();

  await timed(log, 'Build', async () => ({
    line: (await build({ log })).join(' and ') || 'nothing changed',
  }));
  shutdown.check();

  const environment = serverEnvironment({ dataDir, address, secrets, mariadb, objectStore, inbox });
  const server = await timed(log, 'Server', async () => {
    const started = startServer({ environment, dataDir });
    shutdown.add('The server', started.stop, started.kill);
    if (started.pid !== undefined) {
      shutdown.lock?.note('server', started.pid);
    }
    await waitUntilHealthy(started, address.localUrl, { log, isStopped: () => shutdown.isRequested });
    return { ...started, line: `ready, logs in ${started.logFile}` };
  });
  shutdown.check();

  const deaths = [
    server.exited.then((how) => `The server ended by itself (${how}). Its log ends:\n${server.lastWords()}`),
    mariadb.exited.then((how) => `MariaDB ended by itself (${how}): see mariadb/mariadb.log in ${dataDir}.`),
    objectStore.failed.then((why) => `The object store broke: ${why}`),
    inbox.failed.then((why) => `The inbox broke: ${why}`),
  ];
  return { address, inbox, deaths };
}

/**
 * @template {{ line: string }} T
 * @param {(line: string) => void} log
 * @param {string} label
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
async function timed(log, label, work) {
  const begin = performance.now();
  const result = await work();
  const seconds = ((performance.now() - begin) / 1000).toFixed(1);
  log(`  ${label.padEnd(9)} ${result.line} (${seconds} s)`);
  return result;
}

/**
 * The last thing a start prints.
 * @param {Awaited<ReturnType<typeof startParts>>} running
 * @returns {string}
 */
export function describeStart({ address, inbox }) {
  const accounts = process.env.SEED_DEMO === '0' ? [] : readDemoAccounts();
  const widths = {
    role: Math.max(...accounts.map((account) => account.role.length), 0),
    email: Math.max(...accounts.map((account) => account.email.length), 0),
  };
  const rows = accounts.map(
    ({ role, email, password }) =>
      `    ${role.padEnd(widths.role)}  ${email.padEnd(widths.email)}  ${password}`,
  );
  return [
    '',
    `Firstcold is ready:  ${address.publicUrl}`,
    '',
    ...(rows.length > 0 ? ['  Sign in as (role, e-mail, password):', ...rows, ''] : []),
    `  Mails it sends:    ${inbox.url}`,
    '  Stop with Ctrl-C.',
    '',
  ].join('\n');
}

/** @returns {{ role: string, email: string, password: string }[]} empty when there are none */
function readDemoAccounts() {
  const file = path.join(PROJECT_ROOT, 'backend', 'scripts', 'demo-accounts.json');
  return fs.existsSync(file) ? JSON.parse(fs.readFileSync(file, 'utf8')) : [];
}
