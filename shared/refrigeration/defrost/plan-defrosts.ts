import type { Working, WorkingLine } from '../working';
import { checkDefrostPlan } from './check-defrost-plan';
import { concurrentLoad } from './concurrent-load';
import type { DefrostNote } from './defrost-breach';
import { defrostInputProblems, type DefrostInputProblem } from './defrost-input-problems';
import type { CircuitStarts, DefrostCircuit, DefrostPlan, DefrostRules } from './defrost-plan-types';
import { startsNeeded } from './defrost-spans';
import { explainBlocked, type BlockingRule } from './explain-blocked';
import { placeWhatFits } from './place-what-fits';
import { placeables } from './placeables';
import { independentParts } from './plan-components';
import { searchPlan } from './search-plan';

export type DefrostPlanning =
  | {
      readonly ok: true;
      readonly plan: DefrostPlan;
      readonly notes: readonly DefrostNote[];
      readonly working: Working;
    }
  | {
      readonly ok: false;
      readonly reason: 'blocked';
      /** See `explainBlocked`. */
      readonly blockedBy: readonly BlockingRule[];
      /** False when the search was cut short: there may be a plan that it hasn't found. */
      readonly proven: boolean;
      /** Breaks no rule; the circuits of `unplacedIds` have no starts. */
      readonly partialPlan: DefrostPlan;
      readonly unplacedIds: readonly string[];
      readonly working: Working;
    }
  | {
      readonly ok: false;
      readonly reason: 'inputProblems';
      readonly problems: readonly DefrostInputProblem[];
    };

/**
 * Plans a day's defrosts so that `checkDefrostPlan` finds no breach. Each circuit's starts are spread evenly over the day, or
 * where quiet hours forbid that, evenly over the hours that are left; hand-set starts stay. The same input gives the same
 * plan on every machine. A "no" is about these spreadings: a plan with other, less even starts isn't ruled out.
 *
 * @param circuits every circuit of the suction groups, those that never defrost too (their load counts). Times in seconds,
 *   powers in watts
 * @param rules times in seconds, powers in watts, shares as fractions
 * @returns the plan in the order of the circuits; or the rules in its way and a plan of those circuits that fit; or the
 *   figures that nothing can be planned with
 * @range see `defrostInputProblems`; made for up to about 60 circuits with up to 6 defrosts a day
 * @source common practice, no source: nobody has published figures for staggering defrosts
 * @example planDefrosts([{ …, id: 'c', perDay: 2 }], USUAL_DEFROST_RULES) // plan: [{ circuitId: 'c', startsS: [0, 43_200] }]
 */
export function planDefrosts(circuits: readonly DefrostCircuit[], rules: DefrostRules): DefrostPlanning {
  const problems = defrostInputProblems(circuits, rules);
  if (problems.length > 0) return { ok: false, reason: 'inputProblems', problems };
  const parts = independentParts(circuits, rules).map((part) => {
    const toPlace = placeables(part, rules);
    return { part, toPlace, result: searchPlan(toPlace) };
  });
  const starts = parts.flatMap(({ result }) => (result.found ? result.plan : []));
  const blocked = parts.filter(({ result }) => !result.found);
  if (blocked.length === 0) return planned(circuits, rules, starts);
  const explanation = explainBlocked({ circuits: blocked.flatMap(({ part }) => part), rules });
  if (!explanation.isBlocked) return planned(circuits, rules, [...starts, ...explanation.plan]);
  const partial = blocked.flatMap(({ toPlace }) => placeWhatFits(toPlace));
  const partialPlan = inOrderOf(circuits, [...starts, ...partial]);
  const placed = new Set(partialPlan.map(({ circuitId }) => circuitId));
  return {
    ok: false,
    reason: 'blocked',
    blockedBy: explanation.blockedBy,
    proven: blocked.some(({ result }) => !result.found && result.proven),
    partialPlan,
    unplacedIds: needing(circuits).filter((id) => !placed.has(id)),
    working: workingOf(circuits, rules, partialPlan),
  };
}

function planned(
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
  starts: readonly CircuitStarts[],
): DefrostPlanning {
  const plan = inOrderOf(circuits, starts);
  const check = checkDefrostPlan(circuits, rules, plan);
  return { ok: true, plan, notes: check.ok ? check.notes : [], working: workingOf(circuits, rules, plan) };
}

const needing = (circuits: readonly DefrostCircuit[]): readonly string[] =>
  circuits.filter((circuit) => startsNeeded(circuit) > 0).map(({ id }) => id);

function inOrderOf(circuits: readonly DefrostCircuit[], starts: readonly CircuitStarts[]): DefrostPlan {
  const byId = new Map(starts.map((entry) => [entry.circuitId, entry]));
  return circuits.flatMap(({ id }) => byId.get(id) ?? []);
}

function workingOf(circuits: readonly DefrostCircuit[], rules: DefrostRules, plan: DefrostPlan): Working {
  const load = concurrentLoad(circuits, plan);
  const peak = Math.max(0, ...load.groups.map(({ peakShare }) => peakShare));
  const limitW = rules.largestHeaterDemandW;
  const heaterLimit: readonly WorkingLine[] =
    limitW === null ? [] : [{ label: 'largestHeaterDemand', value: limitW, unit: 'W_el' }];
  return {
    formula: 'defrostPlan',
    source: 'common practice, no source',
    lines: [
      { label: 'step', value: rules.stepS, unit: 's' },
      { label: 'leastGapBetweenStarts', value: rules.leastGapBetweenStartsS, unit: 's' },
      { label: 'largestShareOfLoad', value: rules.largestShareOfLoad, unit: 'fraction' },
      { label: 'largestShareInHotGas', value: rules.largestShareInHotGas, unit: 'fraction' },
      ...heaterLimit,
      { label: 'circuits', value: circuits.length, unit: 'count' },
      { label: 'peakShareOfLoad', value: peak, unit: 'fraction' },
      { label: 'peakHeaterDemand', value: load.heaters.peakW, unit: 'W_el' },
      { label: 'defrosts', value: plan.reduce((sum, { startsS }) => sum + startsS.length, 0), unit: 'count' },
    ],
  };
}
