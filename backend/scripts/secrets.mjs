import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { ScriptFailure } from './failure.mjs';
import { writeFileAtomically } from './paths.mjs';

/**
 * @typedef {object} Secrets
 * @property {string} databaseRootPassword
 * @property {string} databaseOwnerPassword
 * @property {string} databaseAppPassword
 * @property {string} s3AccessKeyId
 * @property {string} s3SecretAccessKey
 * @property {string} sessionSecret
 */

/**
 * The passwords of this installation: random, made once, readable by their owner only. Nothing in the
 * project's files is a working password.
 * @param {string} dataDir
 * @returns {Secrets}
 */
export function loadSecrets(dataDir) {
  const file = path.join(dataDir, 'secrets.json');
  const known = readSecrets(file);
  const secrets = {
    databaseRootPassword: known.databaseRootPassword ?? randomWord(24),
    databaseOwnerPassword: known.databaseOwnerPassword ?? randomWord(24),
    databaseAppPassword: known.databaseAppPassword ?? randomWord(24),
    s3AccessKeyId: known.s3AccessKeyId ?? `FC${randomBytes(9).toString('hex').toUpperCase()}`,
    s3SecretAccessKey: known.s3SecretAccessKey ?? randomWord(30),
    sessionSecret: known.sessionSecret ?? randomWord(48),
  };
  const text = `${JSON.stringify({ ...known, ...secrets }, null, 2)}\n`;
  if (JSON.stringify(known) !== JSON.stringify({ ...known, ...secrets })) {
    writeFileAtomically(file, text, 0o600);
  }
  fs.chmodSync(file, 0o600);
  return secrets;
}

/**
 * @param {string} file
 * @returns {Partial<Secrets>}
 */
function readSecrets(file) {
  if (!fs.existsSync(file)) {
    return {};
  }
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'));
  } catch {
    // Guessing here would lock people out silently, so a person has to look.
    throw new ScriptFailure(`${file} is damaged: repair it, or delete it to have new secrets made.`);
  }
}

/** @param {number} bytes */
function randomWord(bytes) {
  return randomBytes(bytes).toString('base64url');
}
