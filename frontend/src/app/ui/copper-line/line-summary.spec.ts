import { describe, expect, it } from '@jest/globals';
import { countStates, shrinkToJoints } from './line-summary';

describe('countStates', () => {
  it('counts each state that occurs, finished ones first', () => {
    const joints = [{ state: 'open' }, { state: 'approved' }, { state: 'open' }] as const;
    expect(countStates(joints)).toEqual([
      { state: 'approved', count: 1 },
      { state: 'open', count: 2 },
    ]);
  });
});

describe('shrinkToJoints', () => {
  it('keeps one joint a circuit where there is room', () => {
    const joints = shrinkToJoints(
      [
        { state: 'approved', count: 2 },
        { state: 'open', count: 1 },
      ],
      24,
    );
    expect(joints).toEqual(['approved', 'approved', 'open']);
  });

  it('still shows one sent-back circuit among two hundred', () => {
    const joints = shrinkToJoints(
      [
        { state: 'approved', count: 120 },
        { state: 'sentBack', count: 1 },
        { state: 'open', count: 79 },
      ],
      20,
    );
    expect(joints).toHaveLength(20);
    expect(joints.filter((state) => state === 'sentBack')).toHaveLength(1);
    expect(joints.filter((state) => state === 'approved').length).toBeGreaterThanOrEqual(11);
  });

  it('draws nothing for an opening without circuits', () => {
    expect(shrinkToJoints([{ state: 'open', count: 0 }], 20)).toEqual([]);
  });

  it('keeps every state even where there are fewer joints than states', () => {
    const counts = [
      { state: 'approved', count: 50 },
      { state: 'submitted', count: 3 },
      { state: 'open', count: 9 },
    ] as const;
    expect(shrinkToJoints(counts, 2)).toEqual(['approved', 'submitted', 'open']);
  });
});
