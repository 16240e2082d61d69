import { describe, expect, it } from '@jest/globals';
import type { Step } from '#shared/checklist/step';
import { lackingOf } from './refused-approval';

const steps = [{ key: 'a' }, { key: 'b' }] as unknown as Step[];
const refusal = (facts: Record<string, unknown>, code = 'wrongState') => ({
  status: 409,
  error: { type: '', title: '', status: 409, detail: '', code, places: [], facts, requestId: '' },
});

describe('lackingOf', () => {
  it('names the steps that are missing, in working order', () => {
    expect(lackingOf(refusal({ missing: ['b', 'a', 'gone'] }), steps)).toEqual({ steps, photos: 0 });
  });

  it('counts the photos that have not arrived', () => {
    expect(lackingOf(refusal({ awaitedPhotos: 3 }), steps)).toEqual({ steps: [], photos: 3 });
  });

  it.each([
    ['a refusal without facts', refusal({})],
    ['facts of another shape', refusal({ missing: 'a', awaitedPhotos: '3' })],
    ['another failure', refusal({ missing: ['a'] }, 'changedMeanwhile')],
    ['no answer at all', new Error('down')],
    ['no error', null],
  ])('is nothing for %s', (_what, error) => {
    expect(lackingOf(error, steps)).toBeNull();
  });
});
