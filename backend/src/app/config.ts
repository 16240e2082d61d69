import * as z from 'zod/mini';
import type { DatabaseAccount } from '../database/data-source';
import { DomainFailure } from '#shared/failures/failure';

const port = z.coerce.number().check(z.int(), z.gte(0), z.lte(65535));
const text = z.string().check(z.minLength(1));

const environmentSchema = z.object({
  HOST: z.optional(text),
  PORT: z._default(port, 4000),
  PUBLIC_URL: z.optional(text),
  DATA_DIR: text,
  DATABASE_HOST: text,
  DATABASE_PORT: port,
  DATABASE_NAME: text,
  DATABASE_OWNER_USER: text,
  DATABASE_OWNER_PASSWORD: z.string(),
  DATABASE_APP_USER: text,
  DATABASE_APP_PASSWORD: z.string(),
  /** The host that the application's account is known by to the database. */
  DATABASE_APP_HOST: z._default(text, '127.0.0.1'),
  S3_ENDPOINT: z.optional(text),
  S3_REGION: z._default(text, 'local'),
  S3_BUCKET: text,
  S3_ACCESS_KEY_ID: text,
  S3_SECRET_ACCESS_KEY: text,
  SMTP_HOST: text,
  SMTP_PORT: port,
  SMTP_USER: z.optional(text),
  SMTP_PASSWORD: z.optional(text),
  MAIL_FROM: text,
  SESSION_SECRET: z.string().check(z.minLength(32)),
  SIGNING_KEY_FILE: text,
  TLS_CERT: z.optional(text),
  TLS_KEY: z.optional(text),
  SEED_DEMO: z.optional(z.string()),
  LOG_LEVEL: z._default(z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']), 'info'),
  /** '0' where background work has processes of its own. */
  RUN_JOBS: z._default(z.enum(['0', '1']), '1'),
});

export type Config = ReturnType<typeof readConfig>;

/**
 * The configuration out of the environment.
 *
 * @throws {DomainFailure} invalidInput, naming every variable that is missing or can't be used
 */
export function readConfig(environment: NodeJS.ProcessEnv) {
  // An empty variable is one that isn't set.
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const parsed = environmentSchema.safeParse(given);
  if (!parsed.success) {
    const places = parsed.error.issues.map((issue) => ({
      path: issue.path.join('.'),
      message: issue.message,
    }));
    const names = places.map((place) => `${place.path} (${place.message})`).join(', ');
    throw new DomainFailure('invalidInput', `The environment lacks or misstates: ${names}.`, places);
  }
  const env = parsed.data;
  const secure = env.TLS_CERT !== undefined && env.TLS_KEY !== undefined;
  const account = (user: string, password: string): DatabaseAccount => ({
    host: env.DATABASE_HOST,
    port: env.DATABASE_PORT,
    database: env.DATABASE_NAME,
    user,
    password,
  });
  return {
    ...env,
    secure,
    host: env.HOST ?? (secure ? '0.0.0.0' : '127.0.0.1'),
    publicUrl: (env.PUBLIC_URL ?? `${secure ? 'https' : 'http'}://localhost:${env.PORT}`).replace(/\/$/, ''),
    ownerAccount: account(env.DATABASE_OWNER_USER, env.DATABASE_OWNER_PASSWORD),
    appAccount: account(env.DATABASE_APP_USER, env.DATABASE_APP_PASSWORD),
    storage: {
      endpoint: env.S3_ENDPOINT ?? null,
      region: env.S3_REGION,
      bucket: env.S3_BUCKET,
      accessKeyId: env.S3_ACCESS_KEY_ID,
      secretAccessKey: env.S3_SECRET_ACCESS_KEY,
    },
    mail: {
      host: env.SMTP_HOST,
      port: env.SMTP_PORT,
      user: env.SMTP_USER ?? null,
      password: env.SMTP_PASSWORD ?? null,
      from: env.MAIL_FROM,
    },
    seedDemo: env.SEED_DEMO === '1',
  };
}
