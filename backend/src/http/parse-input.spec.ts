import { describe, expect, it } from '@jest/globals';
import * as z from 'zod/mini';
import { DomainFailure } from '#shared/failures/failure';
import { parseInput } from './parse-input';

const schema = z.strictObject({
  name: z.string(),
  list: z.array(z.object({ count: z.int() })),
});

function refusal(value: unknown, part = 'body'): DomainFailure {
  try {
    parseInput(schema, value, part);
  } catch (error) {
    if (error instanceof DomainFailure) return error;
  }
  throw new Error('It was not refused');
}

const paths = (value: unknown, part?: string) => refusal(value, part).places.map((place) => place.path);

describe('parseInput', () => {
  it('gives what the schema makes of it', () => {
    expect(parseInput(z.object({ limit: z.coerce.number() }), { limit: '5' }, 'query')).toEqual({ limit: 5 });
  });

  it('names each place that is wrong, starting with the part of the request', () => {
    expect(paths({ name: 1, list: [{ count: 1 }, { count: 'x' }] })).toEqual([
      'body.name',
      'body.list.1.count',
    ]);
    expect(refusal({}).code).toBe('invalidInput');
  });

  it.each([undefined, null, 'text', 5, []])('names the part itself where %j came instead', (value) => {
    expect(paths(value, 'query')).toEqual(['query']);
  });

  it('refuses what it doesn’t know', () => {
    expect(paths({ name: 'a', list: [], isAdmin: true })).toEqual(['body']);
  });

  it('names at most 50 places of a request that is wrong everywhere', () => {
    const list = Array.from({ length: 500 }, () => ({ count: 'x' }));
    expect(paths({ name: 'a', list })).toHaveLength(50);
  });

  it('repeats no value that was sent', () => {
    const { message, places } = refusal({ name: 'a', list: [{ count: 'secret words' }] });
    expect(JSON.stringify({ message, places })).not.toContain('secret');
  });
});
