import type { Kelvin, PascalAbsolute } from '../../units/quantity';
import type { SafetyClass } from '../saturation/saturation-table';
import type { WorkingLine } from '../working';

/** One printed row: both pressures at one temperature. Of a pure refrigerant the two are the same. */
export interface MakersPoint {
  readonly temperature: Kelvin;
  readonly bubble: PascalAbsolute;
  readonly dew: PascalAbsolute;
}

/** A refrigerant by the pressure–temperature table of its maker. Plain numbers and text, so it travels as JSON. */
export interface MakersTable {
  /** As the sheet names the refrigerant, such as "R-454C". */
  readonly designation: string;
  /** Who published the sheet. */
  readonly issuer: string;
  /** Edition, revision or date of the sheet, as printed. */
  readonly edition: string;
  /** Ascending in temperature. */
  readonly points: readonly MakersPoint[];
  /** The last digit of the printed pressures in pascals; leave out when unknown: a tenth of a psi is assumed. */
  readonly printedStepPa?: number;
  /** As the sheet or the cylinder says; no figure depends on it. Leave out while nobody has said. */
  readonly safetyClass?: SafetyClass;
}

/**
 * What is wrong or odd about a table, as a key that screens translate.
 *
 * Refused: `noDesignation`, `noIssuer`; `tooFewPoints`; `notFinite`, `belowAbsoluteZero`, `notPositive` (a pressure at or
 * below a perfect vacuum); `notAscending`, `descending` (the whole table), `repeatedTemperature`, `gapTooWide`;
 * `notRising` (pressure falls or stands while temperature rises); `dewAboveBubble` (some rows), `columnsSwapped` (all);
 * `outlyingPoint` (one row that its neighbours contradict), `notSmooth` (too many of them).
 *
 * Asked: `noEdition`; `gaugeTakenForAbsolute`, `absoluteTakenForGauge`, `celsiusInFahrenheit`, `fahrenheitInCelsius` (the
 * figures behave like a refrigerant only after that mistake is undone; named as in `DoubtKind`: °C typed as °F, °F typed
 * as °C); `unlikeAnyRefrigerant` (they behave like none); `farFromRelatives` (the pressure is far from all relatives);
 * `differsFromOwn` (the program has figures of the very same refrigerant, and they say something else).
 */
export type MakersTableProblemCode =
  | 'noDesignation'
  | 'noIssuer'
  | 'noEdition'
  | 'tooFewPoints'
  | 'notFinite'
  | 'belowAbsoluteZero'
  | 'notPositive'
  | 'notAscending'
  | 'descending'
  | 'repeatedTemperature'
  | 'gapTooWide'
  | 'notRising'
  | 'dewAboveBubble'
  | 'columnsSwapped'
  | 'outlyingPoint'
  | 'notSmooth'
  | 'gaugeTakenForAbsolute'
  | 'absoluteTakenForGauge'
  | 'celsiusInFahrenheit'
  | 'fahrenheitInCelsius'
  | 'unlikeAnyRefrigerant'
  | 'farFromRelatives'
  | 'differsFromOwn';

export type PhaseColumn = 'bubble' | 'dew';

/** One finding about a table. */
export interface MakersTableProblem {
  readonly code: MakersTableProblemCode;
  /** `refuse`: nothing can be worked out from it. `ask`: a person may insist. */
  readonly severity: 'refuse' | 'ask';
  /** Position in `points`, counted from 1; null when it is about the whole table. */
  readonly row: number | null;
  /** Which pressure it is about; `both` where the row's temperature is as suspect as its pressures. */
  readonly column: PhaseColumn | 'both' | null;
  /** The figures it rests on, in SI units; labels are keys that screens translate. */
  readonly values: readonly WorkingLine[];
}

/** Builds a problem; what is left out is null or empty. */
export const problem = (
  code: MakersTableProblemCode,
  severity: 'refuse' | 'ask',
  about: Partial<Pick<MakersTableProblem, 'row' | 'column' | 'values'>> = {},
): MakersTableProblem => ({ code, severity, row: null, column: null, values: [], ...about });

/** Fewest rows that can vouch for each other: each is held against four others, with one to spare. */
export const FEWEST_POINTS = 6;

/** Widest step between two rows; what the cubic between rows was tested with. */
export const WIDEST_GAP_K = 10;

/** A tenth of a psi, the usual last digit of printed tables. */
export const USUAL_PRINTED_STEP_PA = 690;
