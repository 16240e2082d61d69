import { describe, expect, it } from '@jest/globals';
import type { PersonId } from '#shared/plant/ids';
import { reviewBar } from './can-review';

const recorders = ['ana' as PersonId];

describe('reviewBar', () => {
  it.each([
    ['submitted', 'ines', true, null],
    ['submitted', 'ana', true, 'fourEyes'],
    ['submitted', 'ines', false, 'notAllowed'],
    ['submitted', null, true, 'notAllowed'],
    ['open', 'ines', true, 'notSubmitted'],
    ['approved', 'ines', true, 'notSubmitted'],
  ] as const)('is for %s and %p (may: %p): %p', (state, person, may, bar) => {
    expect(reviewBar({ state, recorders }, person, may)).toBe(bar);
  });
});
