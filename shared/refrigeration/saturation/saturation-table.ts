/**
 * Safety groups of ANSI/ASHRAE Standard 34: toxicity A (lower) or B (higher); flammability 1 (no flame propagation), 2L
 * (lower), 2, 3 (higher).
 */
export const SAFETY_CLASSES = ['A1', 'A2L', 'A2', 'A3', 'B1', 'B2L', 'B2', 'B3'] as const;
export type SafetyClass = (typeof SAFETY_CLASSES)[number];

/** Temperatures of a table's rows: evenly spaced, or written out in kelvin where a maker's table is uneven. */
export type TemperatureGrid = { readonly startK: number; readonly stepK: number } | readonly number[];

/** One component of a blend, in per cent of mass. */
export interface Component {
  readonly designation: string;
  readonly massPercent: number;
}

/** Bubble and dew pressures of one refrigerant over temperature, with where they come from and how far they hold. */
export interface SaturationTable {
  /** ANSI/ASHRAE Standard 34 designation, such as "R-448A". */
  readonly designation: string;
  /** Other ways people write it; found without regard to case and punctuation. */
  readonly names: readonly string[];
  readonly composition: readonly Component[];
  /** What kind of model the figures come from. */
  readonly model: string;
  /** Who worked the figures out: a program with its version, or a refrigerant maker's table. */
  readonly source: string;
  /** The published equations behind the figures. */
  readonly reference: string;
  /** Null where a maker's table doesn't say. */
  readonly criticalK: number | null;
  /** Absolute; null where a maker's table doesn't say. */
  readonly criticalPa: number | null;
  /** Coldest temperature that is answered. */
  readonly lowerLimitK: number;
  /** Warmest temperature that is answered: below the critical point there is too much bend to interpolate. */
  readonly upperLimitK: number;
  readonly temperaturesK: TemperatureGrid;
  /** Saturated liquid, absolute, one value a row. */
  readonly bubblePa: readonly number[];
  /** Saturated vapour, absolute, one value a row. */
  readonly dewPa: readonly number[];
  /** Whether bubble and dew differ enough to matter in the field: more than 0.2 K at 0 °C. */
  readonly glide: boolean;
  /** Null where a maker's table doesn't say. */
  readonly safetyClass: SafetyClass | null;
  /** What a reader must know where the evidence for these figures is thin; null where it isn't. */
  readonly limitNote: { readonly en: string; readonly es: string } | null;
}
