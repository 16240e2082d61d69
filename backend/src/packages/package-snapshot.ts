import type { CircuitRow } from '#shared/contracts/openings';
import type { Level } from '#shared/plant/words';
import type { SequenceId } from '#shared/plant/ids';
import type { SummarySystem } from './document/package-content';

/** One circuit as it stood in the moment that a package shows. */
export interface SnapshotCircuit {
  readonly sequenceId: SequenceId | null;
  readonly position: number;
  readonly headHash: string | null;
  /** Absent in snapshots that were taken before levels came: a circuit. */
  readonly level?: Level;
  readonly code: string;
  readonly description: string;
  readonly area: string;
  readonly state: CircuitRow['state'];
}

/** All circuits of an opening in one moment, in the order of the schedule. */
export interface PackageSnapshot {
  /** The defrost plan that counted in that moment; absent in older snapshots, `null` for none. */
  readonly defrostPlanId?: string | null;
  readonly systems: readonly {
    readonly name: string;
    readonly refrigerant: string;
    readonly circuits: readonly SnapshotCircuit[];
  }[];
}

/** Whether it counts as one of the store's circuits; the work of a system or a group has a chapter, but isn't counted. */
export const isCircuit = ({ level = 'circuit' }: Pick<SnapshotCircuit, 'level'>): boolean =>
  level === 'circuit';

export function summaryOf(snapshot: PackageSnapshot): readonly SummarySystem[] {
  return snapshot.systems.map(({ name, refrigerant, circuits }) => ({
    name,
    refrigerant,
    work: circuits.flatMap(({ level = 'circuit', code, state }) =>
      level === 'circuit' ? [] : [{ level, code, state }],
    ),
    circuits: circuits
      .filter(isCircuit)
      .map(({ code, description, area, state }) => ({ code, description, area, state })),
  }));
}

/** The circuits that have a sequence, each with the name of its system. */
export function sequencesOf(
  snapshot: PackageSnapshot,
): readonly (SnapshotCircuit & { readonly sequenceId: SequenceId; readonly systemName: string })[] {
  return snapshot.systems.flatMap((system) =>
    system.circuits.flatMap((circuit) =>
      circuit.sequenceId === null
        ? []
        : [{ ...circuit, sequenceId: circuit.sequenceId, systemName: system.name }],
    ),
  );
}
