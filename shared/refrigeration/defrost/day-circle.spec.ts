import { describe, expect, it } from '@jest/globals';
import { lasts, overlap, secondsApart, secondsUntil } from './day-circle';
import { at } from './defrost.fixture';

describe('the day as a circle', () => {
  it.each([
    [at(1), at(2), 3600],
    [at(23, 50), at(0, 10), 1200],
    [at(0, 10), at(23, 50), 85_200],
    [at(5), at(5), 0],
  ])('from %d until %d are %d s', (fromS, toS, expected) => {
    expect(secondsUntil(fromS, toS)).toBe(expected);
  });

  it('takes the shorter way round between two moments', () => {
    expect(secondsApart(at(0, 10), at(23, 50))).toBe(1200);
    expect(secondsApart(at(0), at(12))).toBe(43_200);
    expect(secondsApart(NaN, 0)).toBeNaN();
  });

  it('counts the start of a span and not its end', () => {
    expect(lasts(at(23, 50), 1200, at(23, 50))).toBe(true);
    expect(lasts(at(23, 50), 1200, at(0, 10) - 1)).toBe(true);
    expect(lasts(at(23, 50), 1200, at(0, 10))).toBe(false);
    expect(lasts(at(23, 50), 1200, at(23, 50) - 1)).toBe(false);
  });

  it('overlaps over midnight, not edge to edge, and not without length', () => {
    const late = { startS: at(23, 30), lengthS: 3600 };
    expect(overlap(late, { startS: at(0, 29), lengthS: 60 })).toBe(true);
    expect(overlap({ startS: at(0, 29), lengthS: 60 }, late)).toBe(true);
    expect(overlap(late, { startS: at(0, 30), lengthS: 60 })).toBe(false);
    expect(overlap({ startS: at(23), lengthS: 1800 }, late)).toBe(false);
    expect(overlap(late, { startS: at(0), lengthS: 0 })).toBe(false);
  });
});
