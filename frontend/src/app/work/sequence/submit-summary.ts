import type { SequenceView } from '#shared/sequences/sequence-view';

/** Why a step stands in the way of a submission: the end of a key of the words. */
export type MissingReason = 'standing' | 'askedAgain' | 'notCounting' | 'open';

/** The reason why a step is missing; a standing override comes first, because it is dangerous to forget. */
export function reasonMissing(view: SequenceView, stepKey: string): MissingReason {
  const fold = view.fold.steps[stepKey];
  if (fold?.overrideStanding) return 'standing';
  if (fold && fold.reopenedBy !== null) return 'askedAgain';
  return fold && !fold.counts ? 'notCounting' : 'open';
}
