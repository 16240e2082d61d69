import { lasts } from './day-circle';
import type { DefrostCircuit, DefrostPlan } from './defrost-plan-types';
import { heaterDemandW, occupiedS } from './defrost-spans';
import { groupWeights, shareOf, type GroupWeights } from './group-weights';

/** One defrost of a plan, with what the rules ask about its circuit. */
export interface PlannedDefrost {
  readonly circuit: DefrostCircuit;
  readonly group: GroupWeights;
  /** Of its group, 0 to 1. */
  readonly share: number;
  readonly startS: number;
  /** Fail-safe time and drip. */
  readonly occupiedS: number;
  /** Null when unknown. */
  readonly heaterW: number | null;
}

/**
 * Every defrost of a plan, sorted by start. Circuits that the plan names but nobody knows are left out, and so are starts
 * that are no second of the day.
 *
 * @param circuits times in seconds, powers in watts
 * @param plan seconds of the day
 * @returns one entry a start
 * @example defrostsOfPlan([circuit], [{ circuitId: circuit.id, startsS: [0, 43_200] }]) // two
 */
export function defrostsOfPlan(
  circuits: readonly DefrostCircuit[],
  plan: DefrostPlan,
): readonly PlannedDefrost[] {
  const defrosts: PlannedDefrost[] = [];
  for (const group of groupWeights(circuits)) {
    for (const circuit of group.circuits) {
      const common = {
        circuit,
        group,
        share: shareOf(group, circuit),
        occupiedS: occupiedS(circuit),
        heaterW: heaterDemandW(circuit),
      };
      for (const startS of startsOf(plan, circuit.id)) defrosts.push({ ...common, startS });
    }
  }
  return defrosts.sort((a, b) => a.startS - b.startS);
}

/**
 * The starts that a plan holds for a circuit, all its entries together, in order.
 *
 * @param plan seconds of the day
 * @param circuitId of the circuit
 * @returns seconds of the day; empty when the plan doesn't name it
 * @example startsOf([{ circuitId: 'c', startsS: [600, 0] }], 'c') // [0, 600]
 */
export const startsOf = (plan: DefrostPlan, circuitId: string): readonly number[] =>
  plan
    .filter((entry) => entry.circuitId === circuitId)
    .flatMap(({ startsS }) => startsS)
    .filter(Number.isFinite)
    .sort((a, b) => a - b);

/**
 * The defrosts that last at a moment, drip included.
 *
 * @param defrosts of a plan
 * @param atS second of the day
 * @returns those among them, each circuit once
 * @example lastingAt(defrosts, 0)
 */
export const lastingAt = (defrosts: readonly PlannedDefrost[], atS: number): readonly PlannedDefrost[] =>
  onePerCircuit(defrosts.filter(({ startS, occupiedS: lengthS }) => lasts(startS, lengthS, atS)));

/**
 * The defrosts whose heaters are on at a moment: not those that drip.
 *
 * @param defrosts of a plan
 * @param atS second of the day
 * @returns those among them, each circuit once
 * @example heatingAt(defrosts, 0)
 */
export const heatingAt = (defrosts: readonly PlannedDefrost[], atS: number): readonly PlannedDefrost[] =>
  onePerCircuit(defrosts.filter(({ startS, circuit }) => lasts(startS, circuit.durationS, atS)));

/** A circuit whose starts are too close is in defrost once, whatever its plan says. */
const onePerCircuit = (defrosts: readonly PlannedDefrost[]): readonly PlannedDefrost[] =>
  defrosts.filter(({ circuit }, index) => defrosts.findIndex((other) => other.circuit === circuit) === index);

/**
 * Each circuit once.
 *
 * @param defrosts of a plan
 * @returns the ids in order
 * @example circuitIdsOf([two defrosts of 'c']) // ['c']
 */
export const circuitIdsOf = (defrosts: readonly PlannedDefrost[]): readonly string[] => [
  ...new Set(defrosts.map(({ circuit }) => circuit.id)),
];
