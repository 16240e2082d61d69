import type { JointState } from '../joint/joint-drawing';

/** From what is finished to what isn't begun: the order in which a line's states are told and drawn. */
export const STATES_IN_ORDER = [
  'approved',
  'submitted',
  'sentBack',
  'underWay',
  'open',
  'noSequence',
] as const;

export type StateCount = { readonly state: JointState; readonly count: number };

/** How many joints stand in each state, those that none stands in left out, finished ones first. */
export function countStates(joints: readonly { readonly state: JointState }[]): readonly StateCount[] {
  return STATES_IN_ORDER.map((state) => ({
    state,
    count: joints.filter((joint) => joint.state === state).length,
  })).filter(({ count }) => count > 0);
}

/**
 * Draws counts as a line of at most `most` joints: each joint stands for the same share, every state that occurs keeps at
 * least one, so that one sent-back circuit in two hundred is still seen.
 */
export function shrinkToJoints(counts: readonly StateCount[], most: number): readonly JointState[] {
  const present = counts.filter(({ count }) => count > 0);
  const total = present.reduce((sum, { count }) => sum + count, 0);
  if (total === 0) return [];
  const wanted = Math.min(most, total);
  const shares = present.map(({ state, count }) => {
    const exact = (count / total) * wanted;
    return { state, exact, joints: Math.max(1, Math.floor(exact)) };
  });
  let drawn = shares.reduce((sum, share) => sum + share.joints, 0);
  while (drawn < wanted) {
    const neediest = shares.reduce((a, b) => (b.exact - b.joints > a.exact - a.joints ? b : a));
    neediest.joints += 1;
    drawn += 1;
  }
  for (; drawn > wanted; drawn -= 1) {
    const fat = shares.filter((share) => share.joints > 1);
    if (fat.length === 0) break;
    fat.reduce((a, b) => (b.joints - b.exact > a.joints - a.exact ? b : a)).joints -= 1;
  }
  return shares.flatMap(({ state, joints }) => Array.from({ length: joints }, () => state));
}
