import { describe, expect, it } from '@jest/globals';
import { circuitTotal, lineOfCounts, stateCounts } from './opening-counts';

const counts = { open: 3, underWay: 1, submitted: 0, sentBack: 2, approved: 4 };

describe('stateCounts', () => {
  it('leaves out states that no circuit is in', () => {
    expect(stateCounts(counts).map(({ state }) => state)).toEqual([
      'approved',
      'sentBack',
      'underWay',
      'open',
    ]);
  });
});

describe('circuitTotal', () => {
  it('adds up all states', () => {
    expect(circuitTotal(counts)).toBe(10);
  });
});

describe('lineOfCounts', () => {
  it('draws a joint a circuit for a small store and never more than two dozen', () => {
    expect(lineOfCounts(counts)).toHaveLength(10);
    expect(lineOfCounts({ ...counts, open: 150 })).toHaveLength(24);
  });
});
