import { leastSpacingS, tooCloseIn, isQuiet } from './check-circuit-starts';
import { DAY_S, secondsApart } from './day-circle';
import type { DefrostCircuit, DefrostRules } from './defrost-plan-types';
import { startsNeeded } from './defrost-spans';

/** One way to spread a circuit's defrosts over the day: its starts in order, as seconds of the day. */
export interface Train {
  readonly startsS: readonly number[];
  /** False where quiet hours pushed the starts from their even spacing. */
  readonly isEven: boolean;
}

/**
 * Every spreading that the planner considers for a circuit: evenly over the day, and evenly over the hours in which it may
 * defrost, each from every point of the grid, hand-set starts put in the place of their nearest neighbours. Those that
 * quiet hours or the least spacing forbid are left out.
 *
 * @param circuit times in seconds; one start or more
 * @param rules step and quiet hours in seconds
 * @returns the even ones first, then by their starts; empty when there is none
 * @example trainsOf({ …, perDay: 2 }, { …, stepS: 21_600 }) // [0, 43 200] and [21 600, 64 800]
 */
export function trainsOf(circuit: DefrostCircuit, rules: DefrostRules): readonly Train[] {
  const clock = Array.from({ length: DAY_S / rules.stepS }, (_, index) => index * rules.stepS);
  const allowed = clock.filter((startS) => !isQuiet(circuit, rules, startS));
  const fixedS = circuit.fixedStartsS ?? [];
  const possible = new Set([...allowed, ...fixedS.filter((startS) => !isQuiet(circuit, rules, startS))]);
  const found = new Map<string, Train>();
  const collect = (points: readonly number[], isEven: boolean): void => {
    for (const spread of evenlyOver(points, startsNeeded(circuit))) {
      const startsS = withFixedStarts(spread, fixedS);
      const key = startsS.join(' ');
      if (!found.has(key) && isPossible(circuit, possible, startsS)) found.set(key, { startsS, isEven });
    }
  };
  collect(clock, true);
  if (allowed.length < clock.length) collect(allowed, false);
  return [...found.values()];
}

/**
 * Whether a circuit's defrosts fit into a day at all, whatever the other circuits do.
 *
 * @param circuit times in seconds; one start or more
 * @param stepS the grid in seconds
 * @returns false when even spacing on the grid is less than one defrost takes
 * @example fitsIntoDay({ …, perDay: 24, durationS: 3600, dripS: 300 }, 300) // false
 */
export const fitsIntoDay = (circuit: DefrostCircuit, stepS: number): boolean => {
  const perDay = startsNeeded(circuit);
  if (perDay === 1) return leastSpacingS(circuit) <= DAY_S;
  return Math.floor(DAY_S / stepS / perDay) * stepS >= leastSpacingS(circuit);
};

const isPossible = (
  circuit: DefrostCircuit,
  possible: ReadonlySet<number>,
  startsS: readonly number[],
): boolean => startsS.every((startS) => possible.has(startS)) && tooCloseIn(circuit, startsS).length === 0;

/** The same pattern from each of the points, so that turning the clock turns the result and nothing else. */
function evenlyOver(points: readonly number[], count: number): readonly (readonly number[])[] {
  const strides = Array.from({ length: count }, (_, index) => Math.round((index * points.length) / count));
  return points.map((_, from) =>
    strides.map((stride) => points[(from + stride) % points.length] ?? 0).sort((a, b) => a - b),
  );
}

function withFixedStarts(startsS: readonly number[], fixedS: readonly number[]): readonly number[] {
  const free = [...startsS];
  for (const fixed of fixedS) {
    const distances = free.map((startS) => secondsApart(startS, fixed));
    free.splice(distances.indexOf(Math.min(...distances)), 1);
  }
  return [...free, ...fixedS].sort((a, b) => a - b);
}
