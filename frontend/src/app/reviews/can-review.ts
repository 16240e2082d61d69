import type { FoldState } from '#shared/sequences/fold-state';

/** Why no verdict can be given now; `null` when one can. */
export type ReviewBar = 'notSubmitted' | 'fourEyes' | 'notAllowed';

/**
 * Whether a person can give a verdict: only on what is submitted, only with the right to, and never on evidence of
 * their own.
 */
export function reviewBar(
  fold: Pick<FoldState, 'state' | 'recorders'>,
  personId: string | null,
  mayReview: boolean,
): ReviewBar | null {
  if (fold.state !== 'submitted') return 'notSubmitted';
  if (personId === null || !mayReview) return 'notAllowed';
  return fold.recorders.some((recorder) => recorder === personId) ? 'fourEyes' : null;
}
