/** How a circuit is defrosted; the same words as the plant's, which this folder may not import. */
export type PlannedDefrostType = 'offTime' | 'electric' | 'hotGas' | 'none';

/** One circuit as the plan sees it: all its coils defrost together. Times in seconds, powers in watts. */
export interface DefrostCircuit {
  readonly id: string;
  readonly code: string;
  /** The suction group whose load it belongs to. */
  readonly groupId: string;
  readonly type: PlannedDefrostType;
  /** Defrosts a day, a whole number. Counts as 0 where the type is `none`. */
  readonly perDay: number;
  /** The fail-safe time: the longest that a defrost can last, so the plan is right even on the worst day. */
  readonly durationS: number;
  /** How long the circuit waits for meltwater afterwards before it refrigerates again. */
  readonly dripS: number;
  /** Design load; null when unknown: then its whole group is judged by count of circuits (see `groupWeights`). */
  readonly loadW: number | null;
  /** What its defrost heaters draw; null when unknown or none. */
  readonly heaterW: number | null;
  /** The walk-in box whose coils it feeds, or null. Circuits of one box never defrost at once. */
  readonly box: string | null;
  /** The air curtain that it shares with other circuits' cases, or null. These never defrost at once either. */
  readonly airCurtain: string | null;
  /** Starts that somebody has set by hand, as seconds of the day. The plan keeps them and adds what is missing. */
  readonly fixedStartsS?: readonly number[];
}

/** A part of the day in which nothing may defrost; past midnight when `toS` is less than `fromS`, empty when equal. */
export interface QuietHours {
  readonly fromS: number;
  readonly toS: number;
}

/** What a plan has to obey. None of these figures has a published source. */
export interface DefrostRules {
  /** The largest part of a suction group's load in defrost at once, 0 to 1. */
  readonly largestShareOfLoad: number;
  /** The largest part of a group's hot-gas circuits, by count, in defrost at once, 0 to 1. */
  readonly largestShareInHotGas: number;
  /** Load of a group that must go on running while one of its circuits takes hot gas, in watts; null for no such rule. */
  readonly leastRunningLoadForHotGasW: number | null;
  /** The same as a part of the group's load, 0 to 1. Both hold where both are given. */
  readonly leastRunningShareForHotGas: number | null;
  /** Between the starts of two circuits of one group, in seconds. */
  readonly leastGapBetweenStartsS: number;
  readonly quietHours: readonly QuietHours[];
  /** All heaters of all groups together, in watts; null for no limit. */
  readonly largestHeaterDemandW: number | null;
  /** The planner's starts are multiples of this, in seconds; it divides the day and is 5 minutes or more. */
  readonly stepS: number;
}

/**
 * Where nothing else is agreed: a quarter of the load, a third of the hot-gas circuits, 15 minutes between starts
 * (common practice, no source). The two that depend on the plant are left out.
 */
export const USUAL_DEFROST_RULES: DefrostRules = {
  largestShareOfLoad: 0.25,
  largestShareInHotGas: 1 / 3,
  leastRunningLoadForHotGasW: null,
  leastRunningShareForHotGas: null,
  leastGapBetweenStartsS: 900,
  quietHours: [],
  largestHeaterDemandW: null,
  stepS: 300,
};

/** Two starts of one circuit are never closer than this part of their even spacing (common practice, no source). */
export const LEAST_PART_OF_EVEN_SPACING = 0.5;

/** When one circuit defrosts, as seconds of the day. */
export interface CircuitStarts {
  readonly circuitId: string;
  readonly startsS: readonly number[];
}

export type DefrostPlan = readonly CircuitStarts[];

/** Rules that a person can loosen; in the order in which the planner tries. */
export const LOOSENABLE_DEFROST_RULES = [
  'fixedStarts',
  'quietHours',
  'gapBetweenStarts',
  'shareOfLoad',
  'shareInHotGas',
  'runningLoadForHotGas',
  'heaterDemand',
  'sharedBox',
  'sharedAirCurtain',
] as const;
export type LoosenableDefrostRule = (typeof LOOSENABLE_DEFROST_RULES)[number];

/** The others say what a plan is at all. */
export type DefrostRule =
  LoosenableDefrostRule | 'tooClose' | 'startsPerDay' | 'startOutsideDay' | 'unknownCircuit';

/** Conversion noise of shares and watts; far below anything that is measured. */
export const SHARE_TOLERANCE = 1e-9;
export const POWER_TOLERANCE_W = 1e-6;
