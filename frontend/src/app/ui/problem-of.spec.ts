import { describe, expect, it } from '@jest/globals';
import { isWorthRetrying, problemCodeOf, problemOf } from './problem-of';

const problem = {
  type: 'about:blank',
  title: 'Conflict',
  status: 409,
  detail: 'The sequence changed.',
  code: 'changedMeanwhile',
  places: [],
  facts: {},
  requestId: 'r-1',
};

describe('problemOf', () => {
  it('finds the problem document in an HTTP error', () => {
    expect(problemOf({ status: 409, error: problem })?.code).toBe('changedMeanwhile');
  });

  it('looks through an error that wraps it', () => {
    expect(
      problemOf(Object.assign(new Error('wrapped'), { cause: { status: 409, error: problem } }))?.status,
    ).toBe(409);
  });

  it('is null for what the server did not say', () => {
    expect(problemOf({ status: 502, error: '<html>' })).toBeNull();
    expect(problemOf(new Error('x'))).toBeNull();
    expect(problemOf(undefined)).toBeNull();
  });
});

describe('problemCodeOf', () => {
  it.each([
    [{ status: 409, error: problem }, 'changedMeanwhile'],
    [{ status: 0, error: null }, 'offline'],
    [{ status: 503, error: '' }, 'temporary'],
    [{ status: 404, error: '' }, 'notFound'],
    [new Error('x'), 'unknown'],
  ])('tells case %# apart', (error, code) => {
    expect(problemCodeOf(error)).toBe(code);
  });
});

describe('isWorthRetrying', () => {
  it('is so for a lost network and not for what a person has to change', () => {
    expect(isWorthRetrying('offline')).toBe(true);
    expect(isWorthRetrying('fourEyes')).toBe(false);
  });
});
