import { describe, expect, it } from '@jest/globals';
import { sha256OfBytes, sha256OfJson, sha256OfText } from './sha256';

// The examples published with FIPS 180-4 by NIST (one block, two blocks, a million letters) and the empty message.
const VECTORS = [
  ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
  ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
  [
    'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
    '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
  ],
  ['a'.repeat(1_000_000), 'cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0'],
] as const;

describe('sha256OfText', () => {
  it.each(VECTORS)('gives the published digest', (text, digest) => {
    expect(sha256OfText(text)).toBe(digest);
  });

  it('takes the UTF-8 bytes of a text', () => {
    expect(sha256OfText('é')).toBe(sha256OfBytes(new Uint8Array([0xc3, 0xa9])));
  });
});

describe('sha256OfBytes', () => {
  it.each(VECTORS)('gives the published digest', (text, digest) => {
    expect(sha256OfBytes(new TextEncoder().encode(text))).toBe(digest);
  });
});

describe('sha256OfJson', () => {
  it('does not depend on the order of members', () => {
    expect(sha256OfJson({ b: 1, a: 2 })).toBe(sha256OfText('{"a":2,"b":1}'));
  });
});
