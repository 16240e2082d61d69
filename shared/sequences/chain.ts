import { canonicalJson } from './canonical-json';
import { sha256OfJson, sha256OfText } from './sha256';
import type { EntryBody, ServerPart, StoredEntry } from './entry';

/** What the first entry of every chain has for its previous hash. */
export const CHAIN_START = '0'.repeat(64);

/** SHA-256 of the body's canonical JSON. */
export function bodyHash(body: EntryBody): string {
  return sha256OfJson(body);
}

/**
 * The hash of an entry in its chain: SHA-256 over the previous hash, the body's hash (both hexadecimal) and the
 * canonical JSON of what the server added, joined by line feeds.
 */
export function chainHash(previousHash: string, hashOfBody: string, server: ServerPart): string {
  return sha256OfText(`${previousHash}\n${hashOfBody}\n${canonicalJson(server)}`);
}

export type ChainFault = 'position' | 'bodyHash' | 'previousHash' | 'hash';

/**
 * Checks a whole chain, in order of position from 1.
 *
 * @returns the first broken link and what is wrong with it, or `null` when all hold
 */
export function findBrokenLink(
  entries: readonly StoredEntry[],
): { position: number; fault: ChainFault } | null {
  let previous = CHAIN_START;
  for (const [index, entry] of entries.entries()) {
    const position = index + 1;
    if (entry.server.position !== position) return { position, fault: 'position' };
    if (bodyHash(entry.body) !== entry.bodyHash) return { position, fault: 'bodyHash' };
    if (entry.previousHash !== previous) return { position, fault: 'previousHash' };
    if (chainHash(previous, entry.bodyHash, entry.server) !== entry.hash) return { position, fault: 'hash' };
    previous = entry.hash;
  }
  return null;
}
