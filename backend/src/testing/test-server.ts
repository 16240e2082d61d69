import { randomBytes, randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import type { Server } from 'node:http';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mysql2/promise';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { readConfig, type Config } from '../app/config';
import { createApp } from '../app/express-app';
import { wireServices, type Services } from '../app/services';
import { createDataSource } from '../database/data-source';
import { migrate } from '../database/migrate';
import { startInbox } from '../../scripts/inbox.mjs';
import { startObjectStore } from '../../scripts/object-store.mjs';

export interface TestServer {
  readonly url: string;
  readonly server: Server;
  readonly config: Config;
  readonly services: Services;
  readonly dataSource: DataSource;
  /** Runs SQL as the database's root: what no application account could. */
  sql<T = Record<string, unknown>>(statement: string, values?: readonly unknown[]): Promise<T[]>;
  /** The mails that have arrived, newest first. */
  mails(): Promise<{ to: string[]; subject: string; text: string }[]>;
  close(): Promise<void>;
}

interface Part {
  close(): Promise<unknown> | unknown;
}

/**
 * A whole server on a throw-away database of its own, with a real object store and a real inbox. The database server
 * itself comes from the test command (TEST_DATABASE_*).
 */
export async function startTestServer(options: { readonly jobs?: boolean } = {}): Promise<TestServer> {
  const name = `test_${process.env['JEST_WORKER_ID'] ?? '1'}_${process.pid}_${randomUUID().slice(0, 8)}`;
  const dataDir = mkdtempSync(join(tmpdir(), 'firstcold-test-'));
  const root = await createConnection({
    host: process.env['TEST_DATABASE_HOST'] ?? '127.0.0.1',
    port: Number(process.env['TEST_DATABASE_PORT']),
    user: process.env['TEST_DATABASE_ROOT_USER'] ?? 'root',
    password: process.env['TEST_DATABASE_ROOT_PASSWORD'] ?? '',
    timezone: 'Z',
  });
  const account = {
    user: `app_${randomBytes(5).toString('hex')}`,
    password: randomBytes(12).toString('hex'),
  };
  await root.query(`CREATE DATABASE \`${name}\``);
  await root.query(`CREATE USER '${account.user}'@'127.0.0.1' IDENTIFIED BY '${account.password}'`);
  const store = await startObjectStore({ dataDir, accessKeyId: 'test' });
  const inbox = await startInbox({ dataDir });
  const config = readConfig(environment(name, dataDir, account, store.url, inbox.smtpPort));
  await migrate(config.ownerAccount, account.user, '127.0.0.1');
  const dataSource = createDataSource(config.appAccount, 8);
  await dataSource.initialize();
  const logger = pino({ level: process.env['TEST_LOG'] ?? 'silent' });
  const services = wireServices(config, dataSource, logger);
  await services.storage.prepare();
  if (options.jobs) services.worker.start();
  const server = createServer(createApp(services, logger, { secure: false, checkResponses: true }));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  return {
    url,
    server,
    config,
    services,
    dataSource,
    async sql(statement, values = []) {
      await root.query(`USE \`${name}\``);
      const [rows] = await root.query(statement, [...values]);
      return rows as never;
    },
    async mails() {
      const response = await fetch(`${inbox.url}/api/mails`);
      return ((await response.json()) as { mails: { to: string[]; subject: string; text: string }[] }).mails;
    },
    async close() {
      services.events.close();
      server.closeAllConnections();
      await new Promise<void>((resolve) => server.close(() => resolve()));
      await services.close();
      await dataSource.destroy();
      await root.query(`DROP DATABASE \`${name}\``);
      await root.query(`DROP USER '${account.user}'@'127.0.0.1'`);
      await root.end();
      for (const part of [store, inbox] as Part[]) await part.close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}

function environment(
  database: string,
  dataDir: string,
  account: { user: string; password: string },
  storeUrl: string,
  smtpPort: number,
): NodeJS.ProcessEnv {
  return {
    PORT: '0',
    PUBLIC_URL: 'http://localhost:4000',
    DATA_DIR: dataDir,
    DATABASE_HOST: process.env['TEST_DATABASE_HOST'] ?? '127.0.0.1',
    DATABASE_PORT: process.env['TEST_DATABASE_PORT'],
    DATABASE_NAME: database,
    DATABASE_OWNER_USER: process.env['TEST_DATABASE_ROOT_USER'] ?? 'root',
    DATABASE_OWNER_PASSWORD: process.env['TEST_DATABASE_ROOT_PASSWORD'],
    DATABASE_APP_USER: account.user,
    DATABASE_APP_PASSWORD: account.password,
    S3_ENDPOINT: storeUrl,
    S3_BUCKET: 'firstcold',
    S3_ACCESS_KEY_ID: 'test',
    S3_SECRET_ACCESS_KEY: 'test',
    SMTP_HOST: '127.0.0.1',
    SMTP_PORT: String(smtpPort),
    MAIL_FROM: 'Firstcold <no-reply@firstcold.example>',
    SESSION_SECRET: randomBytes(24).toString('hex'),
    SIGNING_KEY_FILE: join(dataDir, 'keys', 'signing.pem'),
    LOG_LEVEL: 'silent',
  };
}
