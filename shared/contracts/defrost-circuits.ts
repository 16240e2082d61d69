import type { DefrostDetails, PlannedCircuit, ScheduledDefrost } from './defrost-plans';

/**
 * The circuits as the planner takes them: what a lead gave by hand goes before the schedule. Nothing is invented: a
 * duration that nobody stated is 0 where it is needed, which `defrostInputProblems` refuses (see `missingFigures`).
 *
 * @param scheduled of the opening; times in seconds, powers in watts
 * @param details by hand; those of circuits that aren't scheduled count for nothing
 * @returns one for each scheduled circuit, in their order
 * @example plannedCircuits([{ …, failSafeS: 2700 }], []) // [{ …, durationS: 2700 }]
 */
export function plannedCircuits(
  scheduled: readonly ScheduledDefrost[],
  details: readonly DefrostDetails[],
): readonly PlannedCircuit[] {
  const byCircuit = new Map(details.map((each) => [each.circuitId, each]));
  return scheduled.map((circuit) => {
    const given = byCircuit.get(circuit.id);
    return {
      id: circuit.id,
      code: circuit.code,
      groupId: circuit.groupId,
      groupName: circuit.groupName,
      type: circuit.type,
      perDay: circuit.perDay,
      durationS: given?.durationS ?? circuit.failSafeS ?? 0,
      dripS: given?.dripS ?? circuit.dripS ?? 0,
      loadW: given?.loadW ?? circuit.loadW,
      heaterW: given?.heaterW ?? null,
      box: given?.box ?? null,
      airCurtain: given?.airCurtain ?? null,
      fixedStartsS: given?.fixedStartsS ?? [],
    };
  });
}

/** Figures that neither the schedule nor anybody by hand has stated; ids of circuits. */
export interface MissingFigures {
  /** Nothing can be planned before they are given. */
  readonly duration: readonly string[];
  /** Counted as no drip. Off-time defrosts are left out: they need none. */
  readonly drip: readonly string[];
  /** Their group is judged by count of circuits. */
  readonly load: readonly string[];
  /** Electric circuits; only a heater limit asks for it. */
  readonly heater: readonly string[];
}

/**
 * What a plan rests on without having been told.
 *
 * @param scheduled of the opening
 * @param details by hand
 * @returns ids of the circuits that lack each figure; those that never defrost lack only a load
 * @example missingFigures([{ …, failSafeS: null, perDay: 4 }], []) // { duration: ['…'], … }
 */
export function missingFigures(
  scheduled: readonly ScheduledDefrost[],
  details: readonly DefrostDetails[],
): MissingFigures {
  const byCircuit = new Map(details.map((each) => [each.circuitId, each]));
  const lacking = (isLacking: (circuit: ScheduledDefrost, given: DefrostDetails | undefined) => boolean) =>
    scheduled.filter((circuit) => isLacking(circuit, byCircuit.get(circuit.id))).map(({ id }) => id);
  const defrosts = ({ type, perDay }: ScheduledDefrost): boolean => type !== 'none' && perDay > 0;
  return {
    duration: lacking((c, given) => defrosts(c) && (given?.durationS ?? c.failSafeS ?? 0) <= 0),
    drip: lacking((c, given) => defrosts(c) && c.type !== 'offTime' && (given?.dripS ?? c.dripS) === null),
    load: lacking((c, given) => (given?.loadW ?? c.loadW) === null),
    heater: lacking((c, given) => defrosts(c) && c.type === 'electric' && (given?.heaterW ?? null) === null),
  };
}

/** Circuits that may feed one walk-in box: a question for a person, since two boxes may be called the same. */
export interface PossibleBox {
  readonly name: string;
  readonly circuitIds: readonly string[];
}

/**
 * Walk-in boxes of the same name under several circuits, as long as nobody has said anything of them.
 *
 * @param scheduled of the opening
 * @param details by hand
 * @returns in the order of the schedule; empty when there is nothing to ask
 * @example possibleBoxes([{ …, walkIns: ['Ice cream box'] }, { …, walkIns: ['Ice cream box'] }], []) // one
 */
export function possibleBoxes(
  scheduled: readonly ScheduledDefrost[],
  details: readonly DefrostDetails[],
): readonly PossibleBox[] {
  const answered = new Set(details.filter(({ box }) => box !== null).map(({ circuitId }) => circuitId));
  const byName = new Map<string, PossibleBox & { circuitIds: string[] }>();
  for (const { id, walkIns, type } of scheduled) {
    if (answered.has(id) || type === 'none') continue;
    for (const name of new Set(walkIns.map((each) => each.trim()))) {
      const found = byName.get(name.toLowerCase()) ?? { name, circuitIds: [] };
      found.circuitIds.push(id);
      byName.set(name.toLowerCase(), found);
    }
  }
  return [...byName.values()].filter(({ circuitIds }) => circuitIds.length > 1);
}
