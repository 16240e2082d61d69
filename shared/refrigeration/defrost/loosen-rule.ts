import type { DefrostCircuit, DefrostRules, LoosenableDefrostRule } from './defrost-plan-types';

/** What a plan is made from. */
export interface DefrostQuestion {
  readonly circuits: readonly DefrostCircuit[];
  readonly rules: DefrostRules;
}

type Loosen = (question: DefrostQuestion) => DefrostQuestion;

const inRules =
  (change: Partial<DefrostRules>): Loosen =>
  ({ circuits, rules }) => ({ circuits, rules: { ...rules, ...change } });

const inCircuits =
  (change: Partial<DefrostCircuit>): Loosen =>
  ({ circuits, rules }) => ({ circuits: circuits.map((circuit) => ({ ...circuit, ...change })), rules });

const LOOSEN: Readonly<Record<LoosenableDefrostRule, Loosen>> = {
  fixedStarts: inCircuits({ fixedStartsS: [] }),
  quietHours: inRules({ quietHours: [] }),
  gapBetweenStarts: inRules({ leastGapBetweenStartsS: 0 }),
  shareOfLoad: inRules({ largestShareOfLoad: 1 }),
  shareInHotGas: inRules({ largestShareInHotGas: 1 }),
  runningLoadForHotGas: inRules({ leastRunningLoadForHotGasW: null, leastRunningShareForHotGas: null }),
  heaterDemand: inRules({ largestHeaterDemandW: null }),
  sharedBox: inCircuits({ box: null }),
  sharedAirCurtain: inCircuits({ airCurtain: null }),
};

/**
 * The same question without one of its rules.
 *
 * @param question circuits and rules
 * @param rule to leave out
 * @returns a new question
 * @example loosen({ circuits, rules }, 'quietHours').rules.quietHours // []
 */
export const loosen = (question: DefrostQuestion, rule: LoosenableDefrostRule): DefrostQuestion =>
  LOOSEN[rule](question);
