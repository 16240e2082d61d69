import {
  createHash,
  createPrivateKey,
  createPublicKey,
  generateKeyPairSync,
  sign,
  verify,
  type KeyObject,
} from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

/**
 * The installation's Ed25519 key (RFC 8032). A chain of hashes that anyone can work out again proves nothing alone;
 * what is signed with this key, whose fingerprint stands in every mail and on every document, came from here.
 */
export class InstallationKey {
  /** SHA-256 of the public key's SPKI bytes. */
  readonly fingerprint: string;
  /** SPKI, base64. */
  readonly publicKey: string;

  private constructor(private readonly key: KeyObject) {
    const spki = createPublicKey(key).export({ format: 'der', type: 'spki' });
    this.publicKey = spki.toString('base64');
    this.fingerprint = createHash('sha256').update(spki).digest('hex');
  }

  /** Reads the key, or makes it at the first start. Several servers of one installation share the file. */
  static load(file: string): InstallationKey {
    if (!existsSync(file)) {
      mkdirSync(dirname(file), { recursive: true, mode: 0o700 });
      const { privateKey } = generateKeyPairSync('ed25519');
      keep(file, privateKey.export({ format: 'pem', type: 'pkcs8' }) as string);
    }
    return new InstallationKey(createPrivateKey(readFileSync(file)));
  }

  /** Signs the UTF-8 bytes of a statement; base64. */
  sign(statement: string): string {
    return sign(null, Buffer.from(statement, 'utf8'), this.key).toString('base64');
  }

  verify(statement: string, signature: string): boolean {
    return verify(
      null,
      Buffer.from(statement, 'utf8'),
      createPublicKey(this.key),
      Buffer.from(signature, 'base64'),
    );
  }
}

/** `wx`: of two servers that start together the first one's key is kept, and the other reads that. */
function keep(file: string, pem: string): void {
  try {
    writeFileSync(file, pem, { mode: 0o600, flag: 'wx' });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
}
