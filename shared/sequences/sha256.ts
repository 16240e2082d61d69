import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import { canonicalJson } from './canonical-json';

/** SHA-256 (FIPS 180-4) of a text's UTF-8 bytes, as 64 lower-case hexadecimal digits. */
export function sha256OfText(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}

/** SHA-256 of bytes, as 64 lower-case hexadecimal digits. */
export function sha256OfBytes(bytes: Uint8Array): string {
  return bytesToHex(sha256(bytes));
}

/** SHA-256 of a value's canonical JSON. */
export function sha256OfJson(value: unknown): string {
  return sha256OfText(canonicalJson(value));
}
