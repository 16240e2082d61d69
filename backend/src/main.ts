import { createServer as createHttpServer, type Server } from 'node:http';
import { createServer as createHttpsServer } from 'node:https';
import { readFileSync } from 'node:fs';
import { createLogger } from './app/logger';
import { DomainFailure } from '#shared/failures/failure';
import { readConfig, type Config } from './app/config';
import { createApp } from './app/express-app';
import { wireServices } from './app/services';
import { createDataSource } from './database/data-source';
import { migrate } from './database/migrate';
import { seedDemo } from './demo/seed-demo';

const SWEEP_MS = 10 * 60_000;
const POOL_SIZE = 16;

/** Migrates, fills in the demo where the database is empty, serves, and ends in order when told to. */
async function main(): Promise<void> {
  const config = readConfig(process.env);
  const logger = createLogger(config.LOG_LEVEL);
  await migrate(config.ownerAccount, config.DATABASE_APP_USER, config.DATABASE_APP_HOST);
  const dataSource = createDataSource(config.appAccount, POOL_SIZE);
  await dataSource.initialize();
  const services = wireServices(config, dataSource, logger);
  await services.storage.prepare();
  if (config.seedDemo) await seedDemo(services, logger);
  if (config.RUN_JOBS === '1') services.worker.start();
  const sweeping = setInterval(() => {
    services.sweep().catch((error: unknown) => logger.warn({ err: error }, 'could not sweep'));
  }, SWEEP_MS);

  const server = makeServer(
    config,
    createApp(services, logger, { secure: config.secure, checkResponses: false }),
  );
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.PORT, config.host, resolve);
  });
  logger.info({ url: config.publicUrl }, 'serving');

  let ending = false;
  const end = async (): Promise<void> => {
    if (ending) return;
    ending = true;
    clearInterval(sweeping);
    const closed = new Promise<void>((resolve) => server.close(() => resolve()));
    services.events.close();
    server.closeIdleConnections();
    // Requests under way get a moment; open streams must not hold up the end.
    setTimeout(() => server.closeAllConnections(), 3_000).unref();
    await closed;
    await services.close();
    await dataSource.destroy();
    logger.info('ended');
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) {
    process.on(signal, () => {
      end().then(
        () => process.exit(0),
        (error: unknown) => {
          logger.error({ err: error }, 'could not end in order');
          process.exit(1);
        },
      );
    });
  }
}

function makeServer(config: Config, app: Parameters<typeof createHttpServer>[1]): Server {
  if (!config.secure) return createHttpServer(app as never);
  return createHttpsServer(
    { cert: readFileSync(config.TLS_CERT as string), key: readFileSync(config.TLS_KEY as string) },
    app as never,
  );
}

main().catch((error: unknown) => {
  // The start script shows what is written here.
  const reason =
    error instanceof DomainFailure ? error.message : error instanceof Error ? error.stack : String(error);
  process.stderr.write(`${reason}\n`);
  process.exit(1);
});
