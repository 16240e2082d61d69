import { describe, expect, it } from '@jest/globals';
import { bodyHash, CHAIN_START, chainHash, findBrokenLink } from './chain';
import { deepFreeze, entryId, personId, Story } from './entries.fixture';
import type { ServerPart, StoredEntry } from './entry';

/** A true chain of three entries. */
function buildChain(): StoredEntry[] {
  const story = new Story([]);
  const bodies = [story.answer(1, 'a'), story.answer(1, 'b'), story.submission(1)].map(({ body }) => body);
  const chain: StoredEntry[] = [];
  for (const [index, body] of bodies.entries()) {
    const server: ServerPart = {
      position: index + 1,
      standing: 'inOrder',
      receivedAt: '2027-01-15T12:00:01.000Z',
      judgement: null,
      judgingVersion: 1,
      stateAfter: 'open',
    };
    const previousHash = chain.at(-1)?.hash ?? CHAIN_START;
    const hashOfBody = bodyHash(body);
    const hash = chainHash(previousHash, hashOfBody, server);
    chain.push({ body, bodyHash: hashOfBody, server, previousHash, hash });
  }
  return chain;
}

/** The true chain with the entry at the position replaced. */
function tamper(position: number, change: (entry: StoredEntry) => StoredEntry): StoredEntry[] {
  return buildChain().map((entry, index) => (index + 1 === position ? change(entry) : entry));
}

describe('findBrokenLink', () => {
  it('finds none in a true chain, nor in an empty one', () => {
    expect(findBrokenLink(buildChain())).toBeNull();
    expect(findBrokenLink([])).toBeNull();
  });

  it('finds a body that was changed', () => {
    const chain = tamper(2, (entry) => ({ ...entry, body: { ...entry.body, authorId: personId(7) } }));
    expect(findBrokenLink(chain)).toEqual({ position: 2, fault: 'bodyHash' });
  });

  it('finds a body that was changed together with its hash', () => {
    const chain = tamper(2, (entry) => {
      const body = { ...entry.body, authorId: personId(7) };
      return { ...entry, body, bodyHash: bodyHash(body) };
    });
    expect(findBrokenLink(chain)).toEqual({ position: 2, fault: 'hash' });
  });

  it('finds the next entry when a changed one was hashed anew throughout', () => {
    const chain = tamper(2, (entry) => {
      const body = { ...entry.body, authorId: personId(7) };
      const hash = chainHash(entry.previousHash, bodyHash(body), entry.server);
      return { ...entry, body, bodyHash: bodyHash(body), hash };
    });
    expect(findBrokenLink(chain)).toEqual({ position: 3, fault: 'previousHash' });
  });

  it.each([
    ['time of arrival', { receivedAt: '2027-01-14T12:00:01.000Z' }],
    ['standing', { standing: 'late' }],
    ['judging version', { judgingVersion: 2 }],
    ['state after it', { stateAfter: 'approved' }],
  ] as const)('finds a changed %s', (_name, change) => {
    const chain = tamper(1, (entry) => ({ ...entry, server: { ...entry.server, ...change } }));
    expect(findBrokenLink(chain)).toEqual({ position: 1, fault: 'hash' });
  });

  it('finds an entry that was taken out, swapped, or put in twice', () => {
    const [first, second, third] = buildChain() as [StoredEntry, StoredEntry, StoredEntry];
    expect(findBrokenLink([second, third])).toEqual({ position: 1, fault: 'position' });
    expect(findBrokenLink([first, third])).toEqual({ position: 2, fault: 'position' });
    expect(findBrokenLink([second, first, third])).toEqual({ position: 1, fault: 'position' });
    expect(findBrokenLink([first, first, second])).toEqual({ position: 2, fault: 'position' });
  });

  it('finds an entry that was taken out even when the rest was numbered anew', () => {
    const [first, , third] = buildChain() as [StoredEntry, StoredEntry, StoredEntry];
    const renumbered = { ...third, server: { ...third.server, position: 2 } };
    expect(findBrokenLink([first, renumbered])).toEqual({ position: 2, fault: 'previousHash' });
  });

  it('finds a first entry that does not begin at the start', () => {
    const chain = tamper(1, (entry) => ({ ...entry, previousHash: 'f'.repeat(64) }));
    expect(findBrokenLink(chain)).toEqual({ position: 1, fault: 'previousHash' });
  });

  it('does not change the entries', () => {
    expect(findBrokenLink(deepFreeze(buildChain()))).toBeNull();
  });
});

describe('bodyHash', () => {
  it('does not depend on the order of the body’s members, and depends on every one of them', () => {
    const { body } = new Story([]).answer(1, 'a');
    expect(bodyHash(Object.fromEntries(Object.entries(body).reverse()) as typeof body)).toBe(bodyHash(body));
    expect(bodyHash({ ...body, supersedes: entryId(9) })).not.toBe(bodyHash(body));
    expect(bodyHash({ ...body, deviceTime: '2027-01-15T12:00:00.001Z' })).not.toBe(bodyHash(body));
  });
});
