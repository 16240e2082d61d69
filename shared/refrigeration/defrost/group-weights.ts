import type { DefrostCircuit } from './defrost-plan-types';

/** What each circuit of one suction group weighs in it. */
export interface GroupWeights {
  readonly groupId: string;
  readonly circuits: readonly DefrostCircuit[];
  /** `count` where a load is missing or all are zero: each circuit then weighs the same. */
  readonly by: 'load' | 'count';
  /** Circuits without a load, whose group is judged by count for their sake. */
  readonly unknownIds: readonly string[];
  /** Sum of the loads that are known, in watts. */
  readonly knownLoadW: number;
  readonly hotGasCount: number;
}

/**
 * The suction groups among the circuits, in the order in which they first appear. A circuit that never defrosts belongs
 * to its group's load all the same.
 *
 * @param circuits loads in watts
 * @returns one entry a group
 * @example groupWeights([{ …, groupId: 'A', loadW: 3000 }, { …, groupId: 'A', loadW: null }]) // by count
 */
export function groupWeights(circuits: readonly DefrostCircuit[]): readonly GroupWeights[] {
  const byGroup = new Map<string, DefrostCircuit[]>();
  for (const circuit of circuits) {
    const group = byGroup.get(circuit.groupId);
    if (group === undefined) byGroup.set(circuit.groupId, [circuit]);
    else group.push(circuit);
  }
  return [...byGroup].map(([groupId, members]) => weigh(groupId, members));
}

function weigh(groupId: string, circuits: readonly DefrostCircuit[]): GroupWeights {
  const unknownIds = circuits.filter(({ loadW }) => loadW === null).map(({ id }) => id);
  const knownLoadW = circuits.reduce((sum, { loadW }) => sum + (loadW ?? 0), 0);
  return {
    groupId,
    circuits,
    by: unknownIds.length === 0 && knownLoadW > 0 ? 'load' : 'count',
    unknownIds,
    knownLoadW,
    hotGasCount: circuits.filter(({ type }) => type === 'hotGas').length,
  };
}

/**
 * A circuit's part of its group.
 *
 * @param group that the circuit belongs to
 * @param circuit load in watts
 * @returns a fraction, 0 to 1
 * @example shareOf(group of 3000 W and 1000 W, the second) // 0.25
 */
export const shareOf = (group: GroupWeights, circuit: DefrostCircuit): number =>
  group.by === 'load' ? (circuit.loadW ?? 0) / group.knownLoadW : 1 / group.circuits.length;
