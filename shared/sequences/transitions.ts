import type { Action } from '../access/may';

export const SEQUENCE_STATES = ['open', 'submitted', 'sentBack', 'approved'] as const;
export type SequenceState = (typeof SEQUENCE_STATES)[number];

export interface Transition {
  readonly from: SequenceState;
  readonly to: SequenceState;
  /** The permission that whoever causes it needs. */
  readonly action: Action;
  readonly cause: 'submission' | 'approved' | 'sentBack' | 'withdrawn';
}

/** Every move that a sequence can make. What isn't here is refused, by the same table, on the server and on the phone. */
export const SEQUENCE_TRANSITIONS: readonly Transition[] = [
  { from: 'open', to: 'submitted', action: 'entry.append', cause: 'submission' },
  { from: 'sentBack', to: 'submitted', action: 'entry.append', cause: 'submission' },
  { from: 'submitted', to: 'approved', action: 'review.give', cause: 'approved' },
  { from: 'submitted', to: 'sentBack', action: 'review.give', cause: 'sentBack' },
  { from: 'approved', to: 'submitted', action: 'review.give', cause: 'withdrawn' },
];

/** The move that a cause makes from a state, or `undefined` when there is none. */
export function transitionFor(from: SequenceState, cause: Transition['cause']): Transition | undefined {
  return SEQUENCE_TRANSITIONS.find((transition) => transition.from === from && transition.cause === cause);
}
