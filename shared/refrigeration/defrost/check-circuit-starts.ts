import { DAY_S, overlap, secondsUntil } from './day-circle';
import type { DefrostBreach } from './defrost-breach';
import {
  LEAST_PART_OF_EVEN_SPACING,
  type DefrostCircuit,
  type DefrostPlan,
  type DefrostRules,
} from './defrost-plan-types';
import { occupiedS, quietSpan, startsNeeded } from './defrost-spans';
import { startsOf } from './defrosts-of-plan';

/**
 * The least that two starts of one circuit may be apart: half of their even spacing, and never less than it takes.
 *
 * @param circuit times in seconds; it needs one start or more
 * @returns seconds
 * @source common practice, no source
 * @example leastSpacingS({ …, perDay: 4, durationS: 1800, dripS: 0 }) // 10 800
 */
export const leastSpacingS = (circuit: DefrostCircuit): number =>
  Math.max((LEAST_PART_OF_EVEN_SPACING * DAY_S) / startsNeeded(circuit), occupiedS(circuit));

/**
 * Where starts of one circuit follow each other too closely, round midnight too. A single start follows itself a day
 * later.
 *
 * @param circuit times in seconds
 * @param startsS seconds of the day, ascending
 * @returns one breach for each gap under `leastSpacingS`
 * @example tooCloseIn({ …, perDay: 2, durationS: 1800, dripS: 0 }, [0, 20_000]) // one: 20 000 of 21 600 s
 */
export function tooCloseIn(circuit: DefrostCircuit, startsS: readonly number[]): readonly DefrostBreach[] {
  if (startsNeeded(circuit) === 0) return [];
  const limit = leastSpacingS(circuit);
  return startsS.flatMap((startS, index) => {
    const value = secondsUntil(startS, startsS[index + 1] ?? startsS[0] ?? startS);
    const gapS = startsS.length === 1 ? DAY_S : value;
    if (gapS >= limit) return [];
    return [{ rule: 'tooClose' as const, circuitIds: [circuit.id], atS: startS, value: gapS, limit }];
  });
}

/**
 * What one circuit's starts break by themselves: their number, hand-set starts that were moved, spacing, quiet hours.
 *
 * @param circuit times in seconds
 * @param rules times in seconds
 * @param plan seconds of the day
 * @returns the breaches; empty when there are none
 * @example circuitBreaches(circuit, rules, []) // startsPerDay: 0 of 4
 */
export function circuitBreaches(
  circuit: DefrostCircuit,
  rules: DefrostRules,
  plan: DefrostPlan,
): readonly DefrostBreach[] {
  const startsS = startsOf(plan, circuit.id);
  const needed = startsNeeded(circuit);
  const found: DefrostBreach[] = [];
  const breach = (
    rule: DefrostBreach['rule'],
    atS: number | null,
    value: number,
    limit: number | null,
  ): void => {
    found.push({ rule, circuitIds: [circuit.id], atS, value, limit });
  };
  if (startsS.length !== needed) breach('startsPerDay', null, startsS.length, needed);
  for (const fixedS of circuit.fixedStartsS ?? [])
    if (!startsS.includes(fixedS)) breach('fixedStarts', fixedS, fixedS, null);
  for (const startS of startsS)
    if (isQuiet(circuit, rules, startS)) breach('quietHours', startS, startS, null);
  return [...found, ...tooCloseIn(circuit, startsS)];
}

/**
 * Whether a defrost, drip included, reaches into quiet hours.
 *
 * @param circuit times in seconds
 * @param rules quiet hours in seconds of the day
 * @param startS second of the day
 * @returns true when it does; ending as they begin, or beginning as they end, is allowed
 * @example isQuiet({ …, durationS: 1800, dripS: 0 }, { …, quietHours: [{ fromS: 1800, toS: 3600 }] }, 0) // false
 */
export const isQuiet = (circuit: DefrostCircuit, rules: DefrostRules, startS: number): boolean =>
  rules.quietHours.some((quiet) => overlap(quietSpan(quiet), { startS, lengthS: occupiedS(circuit) }));
