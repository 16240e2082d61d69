import { kilogram, type Kilogram } from '../../units/quantity';
import type { Working, WorkingLine } from '../working';

/**
 * Why refrigerant was added. Only a `topOff` is a loss made good: the initial charge, what is added to finish a new
 * installation, a retrofit's charge and a seasonal variance aren't (40 CFR 82.157(b)).
 */
export type AdditionKind =
  'topOff' | 'initialCharge' | 'installationTopOff' | 'retrofit' | 'seasonalVariance';

export interface RefrigerantAddition {
  readonly mass: Kilogram;
  readonly kind: AdditionKind;
  /** Whole days before the day for which the rate is worked out; zero is that day. */
  readonly daysAgo: number;
}

export type LeakRateRefusal =
  'notFinite' | 'negativeMass' | 'fullChargeNotPositive' | 'daysNotPositive' | 'negativeDays';

export type LeakRateResult =
  | {
      readonly ok: true;
      /** Share of the full charge lost in a year: 0.2 is 20 %. */
      readonly ratePerYear: number;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: LeakRateRefusal };

/**
 * Leak rates that an appliance mustn't exceed, as fractions of its full charge in a year (40 CFR 82.157(c)(2), and
 * 89 FR 82682 for 40 CFR 84.106: HFC systems from 15 lb on, since 2026-01-01).
 */
export const LEAK_RATE_THRESHOLDS = {
  commercialRefrigeration: 0.2,
  industrialProcessRefrigeration: 0.3,
  comfortCooling: 0.1,
} as const;

const DAYS_PER_YEAR = 365;

const SOURCE = '40 CFR 84.102 and 82.152, definition of leak rate';

/**
 * Whether an addition counts towards a leak rate.
 *
 * @source 40 CFR 82.157(b): every addition but those after the installation of a new appliance, a retrofit, or a seasonal
 *   variance
 * @example countsAsLoss('initialCharge') // false
 */
export const countsAsLoss = (kind: AdditionKind): boolean => kind === 'topOff';

function refusalOf(fullCharge: Kilogram, masses: readonly Kilogram[]): LeakRateRefusal | null {
  if (![fullCharge, ...masses].every(Number.isFinite)) return 'notFinite';
  if (fullCharge <= 0) return 'fullChargeNotPositive';
  return masses.some((mass) => mass < 0) ? 'negativeMass' : null;
}

function rated(
  formula: string,
  ratePerYear: number,
  lines: readonly WorkingLine[],
): Extract<LeakRateResult, { ok: true }> {
  const result: WorkingLine = { label: 'leakRatePerYear', value: ratePerYear, unit: 'fraction' };
  return { ok: true, ratePerYear, working: { formula, source: SOURCE, lines: [...lines, result] } };
}

export interface AnnualisingInputs {
  /** Added now, all that was added today together; only what `countsAsLoss`. */
  readonly added: Kilogram;
  readonly fullCharge: Kilogram;
  /** Whole days since refrigerant was last added; null when it never was: then a year is taken. */
  readonly daysSinceLastAddition: number | null;
}

/**
 * The leak rate by the annualising method: what was added, as if it went on being lost at the pace since the last
 * addition. More than a year counts as a year.
 *
 * @param inputs masses in kilograms, days
 * @returns fraction of the full charge in a year, or the reason why there is none
 * @source 40 CFR 84.102 (same as 82.152), known from summaries; that a first addition takes 365 days likewise
 * @example annualisedLeakRate({ added: 10 lb, fullCharge: 100 lb, daysSinceLastAddition: 180 }) // 0.2028
 */
export function annualisedLeakRate(inputs: AnnualisingInputs): LeakRateResult {
  const { added, fullCharge, daysSinceLastAddition } = inputs;
  const refusal = refusalOf(fullCharge, [added]);
  if (refusal !== null) return { ok: false, reason: refusal };
  const sinceDays = daysSinceLastAddition ?? DAYS_PER_YEAR;
  if (!Number.isFinite(sinceDays)) return { ok: false, reason: 'notFinite' };
  if (sinceDays <= 0) return { ok: false, reason: 'daysNotPositive' };
  const countedDays = Math.min(sinceDays, DAYS_PER_YEAR);
  return rated('leakRateAnnualised', (added / fullCharge) * (DAYS_PER_YEAR / countedDays), [
    { label: 'added', value: added, unit: 'kg' },
    { label: 'fullCharge', value: fullCharge, unit: 'kg' },
    { label: 'daysSinceLastAddition', value: sinceDays, unit: 'count' },
    { label: 'countedDays', value: countedDays, unit: 'count' },
  ]);
}

export interface RollingInputs {
  /** In any order. */
  readonly additions: readonly RefrigerantAddition[];
  readonly fullCharge: Kilogram;
  /** Whole days since the last successful follow-up verification test of a repair; null when there was none. */
  readonly daysSinceVerification: number | null;
}

const isCounted = ({ kind, daysAgo }: RefrigerantAddition, sinceVerification: number | null): boolean =>
  countsAsLoss(kind) &&
  daysAgo <= DAYS_PER_YEAR &&
  // What was added on the day of the test went in before the test found the repair good.
  (sinceVerification === null || daysAgo < sinceVerification);

/**
 * The leak rate by the rolling average method: what was added in the last 365 days, or since the last successful
 * follow-up verification test when that is less.
 *
 * @param inputs masses in kilograms, days
 * @returns fraction of the full charge in a year, or the reason why there is none
 * @source 40 CFR 84.102 (same as 82.152), known from summaries
 * @example rollingLeakRate({ additions: [10 lb 20 days ago, 5 lb 400 days ago], fullCharge: 100 lb, … }) // 0.1
 */
export function rollingLeakRate(inputs: RollingInputs): LeakRateResult {
  const { additions, fullCharge, daysSinceVerification } = inputs;
  const refusal = refusalOf(
    fullCharge,
    additions.map(({ mass }) => mass),
  );
  if (refusal !== null) return { ok: false, reason: refusal };
  const days = [...additions.map(({ daysAgo }) => daysAgo), daysSinceVerification ?? 0];
  if (!days.every(Number.isFinite)) return { ok: false, reason: 'notFinite' };
  if (days.some((value) => value < 0)) return { ok: false, reason: 'negativeDays' };
  const counted = additions.filter((addition) => isCounted(addition, daysSinceVerification));
  const added = kilogram(counted.reduce((sum, { mass }) => sum + mass, 0));
  return rated('leakRateRolling', added / fullCharge, [
    {
      label: 'countedDays',
      value: Math.min(daysSinceVerification ?? DAYS_PER_YEAR, DAYS_PER_YEAR),
      unit: 'count',
    },
    { label: 'countedAdditions', value: counted.length, unit: 'count' },
    { label: 'added', value: added, unit: 'kg' },
    { label: 'fullCharge', value: fullCharge, unit: 'kg' },
  ]);
}
