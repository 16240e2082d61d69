import type { Second } from '../../units/quantity';

/** Samples in ascending order of time; of those at the same time the first, and none without a time. */
export function inOrderOfTime<Sample extends { readonly at: Second }>(samples: readonly Sample[]): Sample[] {
  const timed = samples.filter(({ at }) => Number.isFinite(at));
  timed.sort((a, b) => a.at - b.at);
  return timed.filter(({ at }, index) => index === 0 || at !== timed[index - 1]?.at);
}
