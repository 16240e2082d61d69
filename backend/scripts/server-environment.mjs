import path from 'node:path';

export const BUCKET = 'firstcold';

/**
 * Everything the server is told. It reads nothing else: the same names serve an installation where the
 * database, the storage and the mail server are somebody else's.
 * @param {object} parts
 * @param {string} parts.dataDir
 * @param {import('./web-address.mjs').WebAddress} parts.address
 * @param {import('./secrets.mjs').Secrets} parts.secrets
 * @param {import('./mariadb.mjs').RunningMariadb} parts.mariadb
 * @param {{ url: string }} parts.objectStore
 * @param {{ url: string, smtpPort: number }} parts.inbox
 * @returns {Record<string, string>} to be laid over the environment of this process
 */
export function serverEnvironment({ dataDir, address, secrets, mariadb, objectStore, inbox }) {
  return {
    NODE_ENV: 'production',
    HOST: address.host,
    PORT: String(address.port),
    PUBLIC_URL: address.publicUrl,
    DATA_DIR: dataDir,
    DATABASE_HOST: mariadb.host,
    DATABASE_PORT: String(mariadb.port),
    DATABASE_NAME: mariadb.database,
    DATABASE_OWNER_USER: mariadb.owner.user,
    DATABASE_OWNER_PASSWORD: mariadb.owner.password,
    DATABASE_APP_USER: mariadb.app.user,
    DATABASE_APP_PASSWORD: mariadb.app.password,
    S3_ENDPOINT: objectStore.url,
    S3_REGION: 'local',
    S3_BUCKET: BUCKET,
    S3_ACCESS_KEY_ID: secrets.s3AccessKeyId,
    S3_SECRET_ACCESS_KEY: secrets.s3SecretAccessKey,
    SMTP_HOST: '127.0.0.1',
    SMTP_PORT: String(inbox.smtpPort),
    MAIL_FROM: process.env.MAIL_FROM || 'Firstcold <no-reply@firstcold.example>',
    SESSION_SECRET: secrets.sessionSecret,
    SIGNING_KEY_FILE: path.join(dataDir, 'keys', 'installation-signing.pem'),
    SEED_DEMO: process.env.SEED_DEMO === '0' ? '0' : '1',
    INBOX_URL: inbox.url,
  };
}
