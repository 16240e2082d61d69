/**
 * What the currents of a heater say is broken, as keys that screens translate.
 *
 * - `noCurrent`: nothing flows in any leg.
 * - `lineOrWyeElementOpen`: one leg dead, the other two at √3/2: its line is open, or, in a wye without neutral, its
 *   element. The two can't be told apart by current.
 * - `wyeElementOpenWithNeutral`: one leg dead, the other two as they should be: a wye whose star point has a neutral.
 * - `deltaElementOpen`: two legs at 1/√3, the third as it should be: the element between the two low ones is open.
 * - `twoDeltaElementsOpen`: one leg dead, the other two at 1/√3: only the element between those two heats.
 * - `legOpen`: a leg is dead, and the others fit no pattern.
 */
export type HeaterFaultPattern =
  | 'noCurrent'
  | 'lineOrWyeElementOpen'
  | 'wyeElementOpenWithNeutral'
  | 'deltaElementOpen'
  | 'twoDeltaElementsOpen'
  | 'legOpen';

export interface HeaterFault {
  readonly pattern: HeaterFaultPattern;
  /** Which legs are dead, or, for `deltaElementOpen`, the two that the open element lies between; counted from zero. */
  readonly legs: readonly number[];
}

/** Less than this share of the expected current is a clamp meter's rest (common practice, no source). */
export const DEAD_LEG_FRACTION = 0.05;

/** How near a ratio must be to a pattern's. Half of what would let √3/2 and 1 overlap (common practice, no source). */
const PATTERN_FRACTION = 0.06;

const ONE_LINE_OPEN = Math.sqrt(3) / 2;
const ONE_DELTA_ELEMENT = 1 / Math.sqrt(3);

const isNear = (ratio: number, pattern: number): boolean =>
  Math.abs(ratio - pattern) <= PATTERN_FRACTION * pattern;

const legsWhere = (ratios: readonly number[], holds: (ratio: number) => boolean): readonly number[] =>
  ratios.flatMap((ratio, leg) => (holds(ratio) ? [leg] : []));

function patternOfOneDeadLeg(living: readonly number[]): HeaterFaultPattern {
  const allNear = (pattern: number): boolean => living.every((ratio) => isNear(ratio, pattern));
  if (allNear(ONE_LINE_OPEN)) return 'lineOrWyeElementOpen';
  if (allNear(ONE_DELTA_ELEMENT)) return 'twoDeltaElementsOpen';
  return allNear(1) ? 'wyeElementOpenWithNeutral' : 'legOpen';
}

/**
 * Which leg or element of a heater is open, as far as its currents tell.
 *
 * @param ratios measured ÷ expected current of each leg: one, or three of a balanced delta or wye
 * @returns the fault, or null when every leg lives and no pattern is clear
 * @source Kirchhoff's laws on three equal resistances, worked by hand
 * @example heaterFault([0.866, 0, 0.866]) // { pattern: 'lineOrWyeElementOpen', legs: [1] }
 */
export function heaterFault(ratios: readonly number[]): HeaterFault | null {
  const isDead = (ratio: number): boolean => ratio < DEAD_LEG_FRACTION;
  const dead = legsWhere(ratios, isDead);
  if (dead.length === ratios.length) return { pattern: 'noCurrent', legs: dead };
  if (dead.length === 1)
    return { pattern: patternOfOneDeadLeg(ratios.filter((ratio) => !isDead(ratio))), legs: dead };
  if (dead.length > 1) return { pattern: 'legOpen', legs: dead };
  const low = legsWhere(ratios, (ratio) => isNear(ratio, ONE_DELTA_ELEMENT));
  const full = legsWhere(ratios, (ratio) => isNear(ratio, 1));
  return low.length === 2 && full.length === 1 ? { pattern: 'deltaElementOpen', legs: low } : null;
}
