import { fitsIntoDay } from './candidate-trains';
import { checkDefrostPlan } from './check-defrost-plan';
import {
  LOOSENABLE_DEFROST_RULES,
  type DefrostCircuit,
  type DefrostPlan,
  type DefrostRule,
  type LoosenableDefrostRule,
} from './defrost-plan-types';
import { startsNeeded } from './defrost-spans';
import { loosen, type DefrostQuestion } from './loosen-rule';
import { placeables } from './placeables';
import { independentParts } from './plan-components';
import { searchPlan } from './search-plan';

/** A rule without which there would be a plan. */
export interface BlockingRule {
  readonly rule: DefrostRule;
  /** The circuits that would break it in the plan found without it. */
  readonly circuitIds: readonly string[];
  /** Empty when loosening this rule alone is enough; else the other rules that have to be loosened with it. */
  readonly onlyWith: readonly DefrostRule[];
}

export type Explanation =
  | { readonly isBlocked: true; readonly blockedBy: readonly BlockingRule[] }
  /** Where the search had been cut short, it may come upon a plan that breaks nothing after all. */
  | { readonly isBlocked: false; readonly plan: DefrostPlan };

// Many questions are asked here. A plan missed within the effort makes the explanation name more rules than need be.
const EFFORT_FOR_ONE = 0.5;
const EFFORT_FOR_SET = 0.1;

/**
 * Says which rules are in the way of a plan, by leaving out one after the other. When no single one is enough, a set is
 * looked for of which all have to be loosened; it is as small as the effort shows, not proven to be the smallest.
 *
 * @param question circuits and rules that have no plan
 * @returns a plan that breaks nothing, if one turns up on the way; else rules, each enough by itself unless `onlyWith` names others; empty when the effort found no plan at all
 * @example explainBlocked({ circuits, rules: with quiet hours all day }) // [{ rule: 'quietHours', … }]
 */
export function explainBlocked(question: DefrostQuestion): Explanation {
  const tooLong = question.circuits.filter((circuit) => neverFits(circuit, question));
  if (tooLong.length > 0)
    return blockedBy([{ rule: 'tooClose', circuitIds: tooLong.map(({ id }) => id), onlyWith: [] }]);
  const relevant = LOOSENABLE_DEFROST_RULES.filter((rule) => isRelevant(question, rule));
  const alone: BlockingRule[] = [];
  for (const rule of relevant) {
    const found = blockingWith(question, [rule], EFFORT_FOR_ONE);
    if (found.isBlocked) alone.push(...found.blockedBy);
    else return found;
  }
  if (alone.length > 0) return blockedBy(alone);
  return blockingWith(question, smallestSet(question, relevant), EFFORT_FOR_SET);
}

const blockedBy = (rules: readonly BlockingRule[]): Explanation => ({ isBlocked: true, blockedBy: rules });

const neverFits = (circuit: DefrostCircuit, { rules }: DefrostQuestion): boolean =>
  startsNeeded(circuit) > 0 && !fitsIntoDay(circuit, rules.stepS);

/** Leaving out a rule that isn't there changes nothing and needs no search. */
function isRelevant({ circuits, rules }: DefrostQuestion, rule: LoosenableDefrostRule): boolean {
  const hasHotGas = circuits.some(({ type }) => type === 'hotGas');
  const relevant: Readonly<Record<LoosenableDefrostRule, boolean>> = {
    fixedStarts: circuits.some(({ fixedStartsS }) => (fixedStartsS ?? []).length > 0),
    quietHours: rules.quietHours.length > 0,
    gapBetweenStarts: rules.leastGapBetweenStartsS > 0,
    shareOfLoad: rules.largestShareOfLoad < 1,
    shareInHotGas: hasHotGas && rules.largestShareInHotGas < 1,
    runningLoadForHotGas:
      hasHotGas && (rules.leastRunningLoadForHotGasW !== null || rules.leastRunningShareForHotGas !== null),
    heaterDemand: rules.largestHeaterDemandW !== null,
    sharedBox: circuits.some(({ box }) => box !== null),
    sharedAirCurtain: circuits.some(({ airCurtain }) => airCurtain !== null),
  };
  return relevant[rule];
}

function smallestSet(
  question: DefrostQuestion,
  relevant: readonly LoosenableDefrostRule[],
): readonly LoosenableDefrostRule[] {
  let kept = relevant;
  for (const rule of relevant) {
    const without = kept.filter((each) => each !== rule);
    if (planWithout(question, without, EFFORT_FOR_SET) !== undefined) kept = without;
  }
  return kept;
}

function blockingWith(
  question: DefrostQuestion,
  loosened: readonly LoosenableDefrostRule[],
  effort: number,
): Explanation {
  const plan = planWithout(question, loosened, effort);
  if (plan === undefined) return blockedBy([]);
  const check = checkDefrostPlan(question.circuits, question.rules, plan);
  const breaches = check.ok ? check.breaches : [];
  if (breaches.length === 0) return { isBlocked: false, plan };
  const rules = loosened.map((rule) => {
    const broken = breaches.filter((breach) => breach.rule === rule);
    return {
      rule,
      circuitIds: [...new Set(broken.flatMap(({ circuitIds }) => circuitIds))],
      onlyWith: loosened.filter((other) => other !== rule),
    };
  });
  return blockedBy(rules);
}

function planWithout(
  question: DefrostQuestion,
  loosened: readonly LoosenableDefrostRule[],
  effort: number,
): DefrostPlan | undefined {
  const { circuits, rules } = loosened.reduce(loosen, question);
  const plan: DefrostPlan[number][] = [];
  for (const part of independentParts(circuits, rules)) {
    const result = searchPlan(placeables(part, rules), effort);
    if (!result.found) return undefined;
    plan.push(...result.plan);
  }
  return plan;
}
