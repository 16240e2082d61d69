import { describe, expect, it } from '@jest/globals';
import { brazedShare } from './opening-line';

describe('brazedShare', () => {
  it.each([
    [0, 40, 0],
    [1, 40, 0.025],
    [40, 40, 1],
    [0, 0, 0],
  ])('is for %i of %i: %f', (approved, total, share) => {
    expect(brazedShare({ approved, total })).toBe(share);
  });
});
