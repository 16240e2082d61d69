import { DAY_S } from './day-circle';
import type { DefrostCircuit, DefrostPlan } from './defrost-plan-types';
import { circuitIdsOf, defrostsOfPlan, heatingAt, lastingAt, type PlannedDefrost } from './defrosts-of-plan';
import { groupWeights } from './group-weights';

/** From `fromS` until the next step, or until midnight. The first begins at 0. */
export interface ShareStep {
  readonly fromS: number;
  /** Of the group's load (or of its circuits, see `by`) in defrost, drip included; 0 to 1. */
  readonly share: number;
  readonly circuitIds: readonly string[];
}

export interface HeaterStep {
  readonly fromS: number;
  /** What is known to be drawn, in watts. */
  readonly demandW: number;
  /** Electric circuits that heat as well, nobody knows with how much. */
  readonly unknownIds: readonly string[];
}

export interface GroupLoadInDefrost {
  readonly groupId: string;
  readonly by: 'load' | 'count';
  readonly steps: readonly ShareStep[];
  readonly peakShare: number;
  /** Second of the day at which the peak is first reached. */
  readonly peakAtS: number;
}

export interface ConcurrentLoad {
  readonly groups: readonly GroupLoadInDefrost[];
  readonly heaters: {
    readonly steps: readonly HeaterStep[];
    readonly peakW: number;
    readonly peakAtS: number;
  };
}

/**
 * What is in defrost at each moment of the day, for a chart of 24 hours: steps that change at a start or an end only.
 *
 * @param circuits times in seconds, powers in watts
 * @param plan seconds of the day; it need not obey any rule
 * @returns one series of shares for each suction group, one of watts for all heaters
 * @range circuits without problems (see `defrostInputProblems`)
 * @example concurrentLoad([{ …, durationS: 1800, dripS: 0 }], [{ …, startsS: [0] }]).groups[0].steps // 1 from 0, 0 from 1800
 */
export function concurrentLoad(circuits: readonly DefrostCircuit[], plan: DefrostPlan): ConcurrentLoad {
  const defrosts = defrostsOfPlan(circuits, plan);
  const groups = groupWeights(circuits).map(({ groupId, by }) => {
    const own = defrosts.filter(({ circuit }) => circuit.groupId === groupId);
    const steps = shareSteps(own);
    const peak = highest(steps, ({ share }) => share);
    return { groupId, by, steps, peakShare: peak.value, peakAtS: peak.atS };
  });
  const steps = heaterSteps(defrosts);
  const peak = highest(steps, ({ demandW }) => demandW);
  return { groups, heaters: { steps, peakW: peak.value, peakAtS: peak.atS } };
}

function shareSteps(defrosts: readonly PlannedDefrost[]): readonly ShareStep[] {
  const steps = changes(defrosts, ({ occupiedS }) => occupiedS).map((fromS) => {
    const lasting = lastingAt(defrosts, fromS);
    return {
      fromS,
      share: lasting.reduce((sum, { share }) => sum + share, 0),
      circuitIds: circuitIdsOf(lasting),
    };
  });
  return withoutRepeats(steps, (a, b) => sameIds(a.circuitIds, b.circuitIds));
}

function heaterSteps(defrosts: readonly PlannedDefrost[]): readonly HeaterStep[] {
  const steps = changes(defrosts, ({ circuit }) => circuit.durationS).map((fromS) => {
    const heating = heatingAt(defrosts, fromS);
    return {
      fromS,
      demandW: heating.reduce((sum, { heaterW }) => sum + (heaterW ?? 0), 0),
      unknownIds: circuitIdsOf(heating.filter(({ heaterW }) => heaterW === null)),
    };
  });
  return withoutRepeats(steps, (a, b) => a.demandW === b.demandW && sameIds(a.unknownIds, b.unknownIds));
}

/** Midnight and every start and end, in order. */
function changes(
  defrosts: readonly PlannedDefrost[],
  lengthOf: (defrost: PlannedDefrost) => number,
): readonly number[] {
  const moments = defrosts.flatMap((defrost) => [
    defrost.startS,
    (defrost.startS + lengthOf(defrost)) % DAY_S,
  ]);
  return [...new Set([0, ...moments])].sort((a, b) => a - b);
}

const sameIds = (a: readonly string[], b: readonly string[]): boolean =>
  a.length === b.length && a.every((id) => b.includes(id));

const withoutRepeats = <Step>(steps: readonly Step[], same: (a: Step, b: Step) => boolean): readonly Step[] =>
  steps.filter((step, index) => {
    const before = steps[index - 1];
    return before === undefined || !same(before, step);
  });

function highest<Step extends { readonly fromS: number }>(
  steps: readonly Step[],
  valueOf: (step: Step) => number,
): { readonly value: number; readonly atS: number } {
  let best = { value: 0, atS: 0 };
  for (const step of steps) {
    const value = valueOf(step);
    if (value > best.value) best = { value, atS: step.fromS };
  }
  return best;
}
