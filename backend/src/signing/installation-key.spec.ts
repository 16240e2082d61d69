import { createHash, createPublicKey, verify } from 'node:crypto';
import fs, { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, jest } from '@jest/globals';
import { InstallationKey } from './installation-key';

describe('InstallationKey', () => {
  let folder: string;
  let file: string;

  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'firstcold-key-'));
    file = join(folder, 'keys', 'signing.pem');
  });
  afterEach(() => {
    jest.restoreAllMocks();
    rmSync(folder, { recursive: true, force: true });
  });

  it('is made at the first start, for nobody else to read', () => {
    InstallationKey.load(file);
    expect(statSync(file).mode & 0o777).toBe(0o600);
    expect(statSync(join(folder, 'keys')).mode & 0o777).toBe(0o700);
  });

  it('is the same at every start after', () => {
    const first = InstallationKey.load(file);
    const bytes = readFileSync(file);
    const second = InstallationKey.load(file);
    expect(readFileSync(file)).toEqual(bytes);
    expect(second.fingerprint).toBe(first.fingerprint);
    expect(second.verify('a statement', first.sign('a statement'))).toBe(true);
  });

  it('is another in another installation', () => {
    const other = InstallationKey.load(join(folder, 'other.pem'));
    const key = InstallationKey.load(file);
    expect(other.fingerprint).not.toBe(key.fingerprint);
    expect(other.verify('a statement', key.sign('a statement'))).toBe(false);
  });

  it('signs so that anybody with the public key alone can check it', () => {
    const key = InstallationKey.load(file);
    const spki = Buffer.from(key.publicKey, 'base64');
    const publicKey = createPublicKey({ key: spki, format: 'der', type: 'spki' });
    const signature = Buffer.from(key.sign('Ünïcode statement'), 'base64');
    expect(publicKey.asymmetricKeyType).toBe('ed25519');
    expect(verify(null, Buffer.from('Ünïcode statement', 'utf8'), publicKey, signature)).toBe(true);
    expect(key.fingerprint).toBe(createHash('sha256').update(spki).digest('hex'));
  });

  it.each(['another statement', 'a statement ', ''])(
    'does not stand for %j when it signed another',
    (text) => {
      const key = InstallationKey.load(file);
      expect(key.verify(text, key.sign('a statement'))).toBe(false);
    },
  );

  it.each(['', 'AAAA', 'not base64!'])('takes %j for no signature', (signature) => {
    expect(InstallationKey.load(file).verify('a statement', signature)).toBe(false);
  });

  it('is not replaced when the file is broken: the start fails', () => {
    writeFileSync(join(folder, 'broken.pem'), 'half a key');
    expect(() => InstallationKey.load(join(folder, 'broken.pem'))).toThrow();
    expect(readFileSync(join(folder, 'broken.pem'), 'utf8')).toBe('half a key');
  });

  it('is the other server’s where two start together', () => {
    const theirs = InstallationKey.load(file);
    // This server looked a moment before the other one wrote.
    jest.spyOn(fs, 'existsSync').mockReturnValueOnce(false);
    expect(InstallationKey.load(file).fingerprint).toBe(theirs.fingerprint);
  });
});
