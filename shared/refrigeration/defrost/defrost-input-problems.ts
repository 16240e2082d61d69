import { DAY_S } from './day-circle';
import type { DefrostCircuit, DefrostRules } from './defrost-plan-types';
import { startsNeeded } from './defrost-spans';

/** A figure that no plan can be made or checked with. */
export interface DefrostInputProblem {
  /** Null when it is one of the rules. */
  readonly circuitId: string | null;
  readonly field: keyof DefrostCircuit | keyof DefrostRules;
}

/** A finer grid only makes the search longer; hand-set starts may lie anywhere between. */
const LEAST_STEP_S = 300;
/** Four times what anybody sets; a slip of the keyboard must not make a plan of a million starts. */
const MOST_PER_DAY = 24;

const isAmount = (value: number): boolean => Number.isFinite(value) && value >= 0;
const isAmountOrNull = (value: number | null): boolean => value === null || isAmount(value);
const isShare = (value: number): boolean => value > 0 && value <= 1;
const isClock = (value: number): boolean => isAmount(value) && value < DAY_S;

/**
 * Looks for figures that are no numbers, negative, impossible, or given twice.
 *
 * @param circuits as for `planDefrosts`
 * @param rules as for `planDefrosts`
 * @returns every problem; empty when there is none
 * @range at most 24 defrosts a day; shares above 0 up to 1; step 300 s or more, dividing the day; fixed starts within the day, no more than needed
 * @example defrostInputProblems([{ …, id: 'c', durationS: NaN }], rules) // [{ circuitId: 'c', field: 'durationS' }]
 */
export function defrostInputProblems(
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
): readonly DefrostInputProblem[] {
  const seen = new Set<string>();
  const problems: DefrostInputProblem[] = [];
  for (const circuit of circuits) {
    if (seen.has(circuit.id)) problems.push({ circuitId: circuit.id, field: 'id' });
    seen.add(circuit.id);
    for (const field of wrongInCircuit(circuit)) problems.push({ circuitId: circuit.id, field });
  }
  return [...problems, ...wrongInRules(rules).map((field) => ({ circuitId: null, field }))];
}

function wrongInCircuit(circuit: DefrostCircuit): readonly (keyof DefrostCircuit)[] {
  const fixed = circuit.fixedStartsS ?? [];
  const fine: Partial<Record<keyof DefrostCircuit, boolean>> = {
    perDay: Number.isInteger(circuit.perDay) && isAmount(circuit.perDay) && circuit.perDay <= MOST_PER_DAY,
    durationS: isAmount(circuit.durationS) && (circuit.durationS > 0 || startsNeeded(circuit) === 0),
    dripS: isAmount(circuit.dripS),
    loadW: isAmountOrNull(circuit.loadW),
    heaterW: isAmountOrNull(circuit.heaterW),
    fixedStartsS: fixed.every(isClock) && !(fixed.length > Math.max(startsNeeded(circuit), 0)),
  };
  return namesOfFalse(fine);
}

function wrongInRules(rules: DefrostRules): readonly (keyof DefrostRules)[] {
  const fine: Record<keyof DefrostRules, boolean> = {
    largestShareOfLoad: isShare(rules.largestShareOfLoad),
    largestShareInHotGas: isShare(rules.largestShareInHotGas),
    leastRunningLoadForHotGasW: isAmountOrNull(rules.leastRunningLoadForHotGasW),
    leastRunningShareForHotGas:
      isAmountOrNull(rules.leastRunningShareForHotGas) && !((rules.leastRunningShareForHotGas ?? 0) > 1),
    leastGapBetweenStartsS: isAmount(rules.leastGapBetweenStartsS),
    quietHours: rules.quietHours.every(
      ({ fromS, toS }) => isAmount(fromS) && isAmount(toS) && fromS <= DAY_S && toS <= DAY_S,
    ),
    largestHeaterDemandW: isAmountOrNull(rules.largestHeaterDemandW),
    stepS: rules.stepS >= LEAST_STEP_S && DAY_S % rules.stepS === 0,
  };
  return namesOfFalse(fine);
}

const namesOfFalse = <Name extends string>(fine: Partial<Record<Name, boolean>>): readonly Name[] =>
  (Object.keys(fine) as Name[]).filter((name) => fine[name] === false);
