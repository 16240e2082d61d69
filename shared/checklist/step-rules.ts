import type { SequenceFacts } from './facts';
import type { Judgement } from './judgement';

/** How one kind of step is judged. Pure: the phone and the server call the same function. */
export interface StepRules<S, A> {
  judge(step: S, answer: A, facts: SequenceFacts): Judgement;
}
