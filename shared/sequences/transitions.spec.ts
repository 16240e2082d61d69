import { describe, expect, it } from '@jest/globals';
import { SEQUENCE_STATES, SEQUENCE_TRANSITIONS, transitionFor, type Transition } from './transitions';

const CAUSES = ['submission', 'approved', 'sentBack', 'withdrawn'] as const satisfies Transition['cause'][];

/** Every move there is; all other pairs are refused. */
const MOVES: Readonly<Record<string, string>> = {
  'open submission': 'submitted',
  'sentBack submission': 'submitted',
  'submitted approved': 'approved',
  'submitted sentBack': 'sentBack',
  'approved withdrawn': 'submitted',
};

const matrix = SEQUENCE_STATES.flatMap((from) =>
  CAUSES.map((cause) => ({ from, cause, to: MOVES[`${from} ${cause}`] })),
);

describe('transitionFor', () => {
  it.each(matrix)('moves from $from by $cause to $to', ({ from, cause, to }) => {
    expect(transitionFor(from, cause)?.to).toBe(to);
  });

  it('leaves every verdict to reviewers and every submission to those who may append', () => {
    for (const { cause, action } of SEQUENCE_TRANSITIONS) {
      expect(action).toBe(cause === 'submission' ? 'entry.append' : 'review.give');
    }
  });

  it('has one answer for each state and cause', () => {
    const pairs = SEQUENCE_TRANSITIONS.map(({ from, cause }) => `${from} ${cause}`);
    expect(new Set(pairs).size).toBe(pairs.length);
  });
});
