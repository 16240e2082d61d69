import { checkDefrostPlan } from './check-defrost-plan';
import { DAY_S } from './day-circle';
import type { CircuitStarts, DefrostCircuit, DefrostPlan, DefrostRules } from './defrost-plan-types';

/**
 * Tries every combination of evenly spaced starts on the grid, for specs: a handful of circuits on a coarse grid only.
 * Asks nothing but the checker; for counts that divide the grid, so that even needs no rounding.
 */
export function exhaustivePlan(
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
): DefrostPlan | undefined {
  const needing = circuits.filter(({ type, perDay }) => type !== 'none' && perDay > 0);
  return extend(circuits, needing, rules, []);
}

function extend(
  circuits: readonly DefrostCircuit[],
  left: readonly DefrostCircuit[],
  rules: DefrostRules,
  plan: readonly CircuitStarts[],
): DefrostPlan | undefined {
  const [next, ...rest] = left;
  if (next === undefined) return plan;
  const spacingS = DAY_S / next.perDay;
  for (let offsetS = 0; offsetS < spacingS; offsetS += rules.stepS) {
    const startsS = Array.from({ length: next.perDay }, (_, index) => offsetS + index * spacingS);
    const longer = [...plan, { circuitId: next.id, startsS }];
    if (!standsSoFar(circuits, rules, longer)) continue;
    const found = extend(circuits, rest, rules, longer);
    if (found !== undefined) return found;
  }
  return undefined;
}

/** More circuits only ever break more rules, apart from the counts of those that aren't placed yet. */
function standsSoFar(circuits: readonly DefrostCircuit[], rules: DefrostRules, plan: DefrostPlan): boolean {
  const check = checkDefrostPlan(circuits, rules, plan);
  return check.ok && check.breaches.every(({ rule }) => rule === 'startsPerDay');
}
