import type { ScheduleProblem } from '#shared/contracts/schedules';
import type { FailureCode } from '#shared/failures/failure';
import type { Defrost } from '#shared/plant/plant';
import type {
  Control,
  EvaporatingBasis,
  Feed,
  FixtureKind,
  SystemKind,
  TemperatureClass,
  ValveKind,
} from '#shared/plant/words';

// A schedule as read from its file and found in order, before anything has an id. SI units; null: the schedule is silent.

/** One display case, or one walk-in box with its unit coolers. */
export interface ParsedFixture {
  /** Unique in the schedule, as the drawings call it. */
  readonly tag: string;
  readonly description: string;
  readonly kind: FixtureKind;
  readonly lengthM: number | null;
  /** Saturated, of the kind that `evaporatingBasis` says. */
  readonly evaporatingTemperatureK: number;
  readonly evaporatingBasis: EvaporatingBasis;
  readonly dischargeAirTemperatureK: number;
  readonly superheatLowK: number;
  readonly superheatHighK: number;
  readonly valveKind: ValveKind;
  readonly coilCount: number;
}

/** One circuit, with its fixtures in the order of the file. */
export interface ParsedCircuit {
  /** Unique in the schedule. */
  readonly code: string;
  readonly description: string;
  readonly area: string;
  readonly temperatureClass: TemperatureClass;
  readonly feed: Feed;
  readonly control: Control;
  readonly loadW: number | null;
  readonly defrost: Defrost;
  readonly fixtures: readonly ParsedFixture[];
}

/** Compressors sharing a suction pressure; its class is the coldest one of its circuits. */
export interface ParsedSuctionGroup {
  /** Unique in its system. */
  readonly name: string;
  readonly temperatureClass: TemperatureClass;
  readonly saturatedSuctionTemperatureK: number;
  readonly circuits: readonly ParsedCircuit[];
}

/** A rack, condensing unit or booster, with its refrigerant's designation. */
export interface ParsedSystem {
  readonly name: string;
  readonly kind: SystemKind;
  readonly refrigerant: string;
  readonly suctionGroups: readonly ParsedSuctionGroup[];
}

/** Everything that a schedule says; each part has at least one member. */
export interface ParsedSchedule {
  readonly systems: readonly ParsedSystem[];
}

/**
 * What came of reading a schedule. `notATable`: no table in it; `tooLarge`: over the limits; `scheduleRefused`: a table
 * with problems, all of which are named.
 */
export type ScheduleReading =
  | {
      readonly ok: true;
      readonly schedule: ParsedSchedule;
      /** Headings that name nothing a schedule is read for, as written: nothing was taken from these columns. */
      readonly ignoredColumns: readonly string[];
    }
  | {
      readonly ok: false;
      readonly code: Extract<FailureCode, 'notATable' | 'tooLarge' | 'scheduleRefused'>;
      readonly problems: ScheduleProblem[];
    };
