import { describe, expect, it } from '@jest/globals';
import { daysLeftKey } from './days-left';

describe('daysLeftKey', () => {
  it.each([
    [9, 'daysToOpening', 9],
    [1, 'daysToOpeningOne', 1],
    [0, 'daysToOpeningToday', 0],
    [-1, 'daysToOpeningPastOne', 1],
    [-12, 'daysToOpeningPast', 12],
  ])('has a sentence for %i days', (days, key, count) => {
    expect(daysLeftKey(days)).toEqual({ key, count });
  });
});
