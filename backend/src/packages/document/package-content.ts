import type { Language } from '#shared/checklist/text';
import type { Joint } from '#shared/contracts/openings';
import type { SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { PackageId, SequenceId } from '#shared/plant/ids';
import type { Level } from '#shared/plant/words';

/** A circuit that has a sequence; it gets a chapter of its own once anything was recorded on it. */
export interface PackageCircuitRef {
  readonly sequenceId: SequenceId;
  /** A system's and a suction group's own work has a chapter too, before those of its circuits. */
  readonly level: Level;
  readonly code: string;
  readonly description: string;
  readonly systemName: string;
  readonly state: Joint['state'];
}

export interface SummaryCircuit {
  readonly code: string;
  readonly description: string;
  readonly area: string;
  readonly state: Joint['state'];
}

/** The own work of a system or of one of its suction groups. */
export interface SummaryWork {
  readonly level: Exclude<Level, 'circuit'>;
  readonly code: string;
  readonly state: Joint['state'];
}

export interface SummarySystem {
  readonly name: string;
  readonly refrigerant: string;
  /** Told beside the circuits and never counted with them; empty where a schedule came before there was such work. */
  readonly work: readonly SummaryWork[];
  readonly circuits: readonly SummaryCircuit[];
}

/** All that a handover package's document says, and where it gets what is too much to hold at once. */
export interface PackageContent {
  readonly opening: {
    readonly name: string;
    readonly address: string;
    /** ISO date. */
    readonly openingDate: string;
    /** IANA name; every time in the document is written in it. */
    readonly timeZone: string;
    readonly elevationM: number;
    readonly unitSystem: 'us' | 'si';
    readonly contractorName: string;
    readonly companyName: string;
  };
  readonly package: {
    readonly id: PackageId;
    readonly version: number;
    readonly language: Language;
    /** ISO date and time. */
    readonly createdAt: string;
    readonly createdByName: string;
  };
  /** SHA-256 of the installation's public key, in lower-case hexadecimal. */
  readonly installation: { readonly fingerprint: string };
  /** Every circuit of the opening, with or without a sequence: what isn't complete is counted on these. */
  readonly summary: { readonly systems: readonly SummarySystem[] };
  /** The defrost plan that counted when the package was asked for; `null`: none, and no section about it. */
  readonly defrostPlan: SavedDefrostPlan | null;
  /** In the order of the chapters. */
  readonly circuits: readonly PackageCircuitRef[];
  /** Called once for each circuit to survey it, then once in each of the two passes for one that gets a chapter. */
  loadCircuit(sequenceId: SequenceId): Promise<SequenceDetail>;
  /** A JPEG of at most 1200 px; `null` when it isn't there or is broken, which the document says in its place. */
  loadPhoto(sequenceId: SequenceId, sha256: string): Promise<Buffer | null>;
}
