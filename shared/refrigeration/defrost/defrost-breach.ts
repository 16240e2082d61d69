import type { DefrostRule } from './defrost-plan-types';

/** A rule that a plan breaks, where and by how much. */
export interface DefrostBreach {
  readonly rule: DefrostRule;
  readonly circuitIds: readonly string[];
  /** Second of the day; null where it is about no moment. */
  readonly atS: number | null;
  /**
   * What was found, in the unit of the rule: a fraction (`shareOfLoad`, `shareInHotGas`), watts (`heaterDemand`), watts or a
   * fraction as the rule was given (`runningLoadForHotGas`), seconds apart (`gapBetweenStarts`, `tooClose`), a count
   * (`startsPerDay`), the start as second of the day (`fixedStarts`, `quietHours`, `startOutsideDay`). Null when it is
   * unknown, or when there is nothing to measure.
   */
  readonly value: number | null;
  /** What was allowed, in the same unit; null where the rule has no figure. */
  readonly limit: number | null;
}

/** Something that a plan may do but that a person should know. */
export interface DefrostNote {
  readonly note: 'aloneOverShare' | 'aloneOverHotGasShare' | 'judgedByCount';
  readonly circuitIds: readonly string[];
  readonly atS: number | null;
  /** A fraction of the group. */
  readonly value: number | null;
  readonly limit: number | null;
}

export interface DefrostFindings {
  readonly breaches: readonly DefrostBreach[];
  readonly notes: readonly DefrostNote[];
}
