import { beforeEach, describe, expect, it } from '@jest/globals';
import type { Step } from '#shared/checklist/step';
import { keepDrafts, remarksOf, restoreDrafts } from './remark-drafts';

describe('drafts', () => {
  beforeEach(() => sessionStorage.clear());

  it('are there again after a reload, each sequence its own', () => {
    keepDrafts(sessionStorage, 's1', { a: 'Photo is blurred', b: '' });
    expect(restoreDrafts(sessionStorage, 's1')).toEqual({ a: 'Photo is blurred' });
    expect(restoreDrafts(sessionStorage, 's2')).toEqual({});
  });

  it('leave nothing behind once they are empty', () => {
    keepDrafts(sessionStorage, 's1', { a: 'x' });
    keepDrafts(sessionStorage, 's1', { a: '' });
    expect(sessionStorage).toHaveLength(0);
  });
});

describe('remarksOf', () => {
  it('takes written remarks in working order and drops steps that are gone', () => {
    const steps = [{ key: 'one' }, { key: 'two' }] as unknown as Step[];
    expect(remarksOf({ two: ' again ', gone: 'x', one: 'why?' }, steps)).toEqual([
      { stepKey: 'one', text: 'why?' },
      { stepKey: 'two', text: 'again' },
    ]);
  });
});
