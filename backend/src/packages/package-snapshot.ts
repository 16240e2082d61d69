import type { CircuitRow } from '#shared/contracts/openings';
import type { SequenceId } from '#shared/plant/ids';
import type { SummarySystem } from './document/package-content';

/** One circuit as it stood in the moment that a package shows. */
export interface SnapshotCircuit {
  readonly sequenceId: SequenceId | null;
  readonly position: number;
  readonly headHash: string | null;
  readonly code: string;
  readonly description: string;
  readonly area: string;
  readonly state: CircuitRow['state'];
}

/** All circuits of an opening in one moment, in the order of the schedule. */
export interface PackageSnapshot {
  readonly systems: readonly {
    readonly name: string;
    readonly refrigerant: string;
    readonly circuits: readonly SnapshotCircuit[];
  }[];
}

export function summaryOf(snapshot: PackageSnapshot): readonly SummarySystem[] {
  return snapshot.systems.map(({ name, refrigerant, circuits }) => ({
    name,
    refrigerant,
    circuits: circuits.map(({ code, description, area, state }) => ({ code, description, area, state })),
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
