import type { Kelvin, KelvinDifference, PascalAbsolute, PascalGauge, Second } from '../units/quantity';
import { toAbsolute } from './gauge-pressure';
import { expectedTestPressure, type PressureTestResult } from './pressure-test';
import type { Working } from './working';

export interface PressureTestReadings {
  readonly startPressure: PascalGauge;
  readonly startTemperature: Kelvin;
  readonly endPressure: PascalGauge;
  /** Temperature of the pipe at the end: not of the air where the pipe lies in the sun. */
  readonly endTemperature: Kelvin;
  readonly atmosphere: PascalAbsolute;
  /** How far the gauge may be wrong either way, in pascals, zero or more. */
  readonly gaugeAccuracyPa: number;
  /** How far the thermometer may be wrong either way, zero or more. */
  readonly temperatureAccuracy: KelvinDifference;
  /** How long the pressure stood. */
  readonly held: Second;
  /** How long the template wants it to stand; null when it doesn't say. */
  readonly leastHold: Second | null;
  /** The loss that the template allows after correction, in pascals; zero when left out. */
  readonly allowedLossPa?: number;
}

/** `rising`: more than the weather explains, so the section is being fed or a reading is wrong. */
export type PressureTestVerdict = 'tight' | 'leak' | 'rising' | 'tooShort';

type ExpectedFailure = Extract<PressureTestResult, { ok: false }>['reason'];

export type JudgedPressureTest =
  | {
      readonly ok: true;
      readonly verdict: PressureTestVerdict;
      /** What a tight section shows at the end. */
      readonly expected: PascalGauge;
      /** Expected minus start: what the temperature did, in pascals. */
      readonly explainedChangePa: number;
      /** End minus expected, in pascals; negative is a loss. */
      readonly unexplainedChangePa: number;
      /** How large an unexplained change the instruments alone can make, in pascals. */
      readonly tolerancePa: number;
      readonly working: Working;
    }
  | {
      readonly ok: false;
      readonly reason: ExpectedFailure | 'negativeAccuracy' | 'negativeDuration' | 'negativeAllowance';
    };

interface TestFigures {
  readonly expected: PascalGauge;
  readonly explainedChangePa: number;
  readonly unexplainedChangePa: number;
  readonly tolerancePa: number;
}

/** Floating-point noise of a conversion, as a fraction of the absolute pressure: no instrument reads this finely. */
const NOISE_FRACTION = 1e-9;

/**
 * How much more than an ideal gas nitrogen follows its temperature, as a fraction of the change for each pascal of
 * absolute pressure: (dB/dT)/R with a second virial coefficient that rises by 2.0e-7 m³/(mol·K) near 290 K (from memory
 * of Dymond and Smith's collection; it turns 300 psig from 80 to 70 °F into 293.9 instead of 294.17 psig).
 */
const NITROGEN_EXCESS_PER_PA = 2.0e-7 / 8.314462618;

function refusalOf(readings: PressureTestReadings): Extract<JudgedPressureTest, { ok: false }> | null {
  const { gaugeAccuracyPa, temperatureAccuracy, held, leastHold, allowedLossPa = 0 } = readings;
  const numbers = [gaugeAccuracyPa, temperatureAccuracy, held, leastHold ?? 0, allowedLossPa];
  if (!numbers.every(Number.isFinite)) return { ok: false, reason: 'notFinite' };
  if (!Number.isFinite(readings.endPressure)) return { ok: false, reason: 'notFinite' };
  if (gaugeAccuracyPa < 0 || temperatureAccuracy < 0) return { ok: false, reason: 'negativeAccuracy' };
  if (held < 0 || (leastHold ?? 0) < 0) return { ok: false, reason: 'negativeDuration' };
  if (allowedLossPa < 0) return { ok: false, reason: 'negativeAllowance' };
  if (toAbsolute(readings.endPressure, readings.atmosphere) <= 0)
    return { ok: false, reason: 'deeperThanVacuum' };
  return null;
}

function toleranceOf(readings: PressureTestReadings, explainedChangePa: number): number {
  const { startTemperature, endTemperature, gaugeAccuracyPa, temperatureAccuracy } = readings;
  const startAbsolute = toAbsolute(readings.startPressure, readings.atmosphere);
  const ratio = endTemperature / startTemperature;
  return Math.hypot(
    gaugeAccuracyPa,
    gaugeAccuracyPa * ratio,
    (startAbsolute / startTemperature) * temperatureAccuracy,
    ((startAbsolute * ratio) / startTemperature) * temperatureAccuracy,
    explainedChangePa * startAbsolute * NITROGEN_EXCESS_PER_PA,
  );
}

function verdictOf(
  readings: PressureTestReadings,
  unexplainedChangePa: number,
  tolerancePa: number,
): PressureTestVerdict {
  const { startPressure, atmosphere, held, leastHold, allowedLossPa = 0 } = readings;
  const noise = NOISE_FRACTION * toAbsolute(startPressure, atmosphere);
  if (-unexplainedChangePa > Math.max(allowedLossPa, tolerancePa) + noise) return 'leak';
  if (unexplainedChangePa > tolerancePa + noise) return 'rising';
  if (leastHold !== null && held < leastHold) return 'tooShort';
  return 'tight';
}

function workingOf(readings: PressureTestReadings, result: TestFigures): Working {
  return {
    formula: 'pressureTestCorrected',
    source:
      'Gay-Lussac’s law on absolute pressure; root-sum-square of the accuracies of both pairs of readings',
    lines: [
      { label: 'startPressure', value: readings.startPressure, unit: 'Pag' },
      { label: 'startTemperature', value: readings.startTemperature, unit: 'K' },
      { label: 'atmosphere', value: readings.atmosphere, unit: 'Pa' },
      { label: 'endTemperature', value: readings.endTemperature, unit: 'K' },
      { label: 'gaugeAccuracy', value: readings.gaugeAccuracyPa, unit: 'Pa_diff' },
      { label: 'temperatureAccuracy', value: readings.temperatureAccuracy, unit: 'K_diff' },
      { label: 'held', value: readings.held, unit: 's' },
      ...(readings.leastHold === null
        ? []
        : [{ label: 'leastHold', value: readings.leastHold, unit: 's' as const }]),
      { label: 'expectedPressure', value: result.expected, unit: 'Pag' },
      { label: 'endPressure', value: readings.endPressure, unit: 'Pag' },
      { label: 'explainedChange', value: result.explainedChangePa, unit: 'Pa_diff' },
      { label: 'allowedLoss', value: readings.allowedLossPa ?? 0, unit: 'Pa_diff' },
      { label: 'tolerance', value: result.tolerancePa, unit: 'Pa_diff' },
      { label: 'unexplainedChange', value: result.unexplainedChangePa, unit: 'Pa_diff' },
    ],
  };
}

/**
 * Judges a standing pressure test with dry nitrogen: what the temperature explains is taken out first, and only what is
 * left beyond the instruments' own room counts.
 *
 * Tolerance: root-sum-square of the gauge's accuracy at the end, of the same at the start (scaled by T2/T1), of the
 * thermometer's accuracy at the start and at the end (each worth the absolute pressure divided by its temperature), and of
 * what nitrogen does beyond an ideal gas. The readings are taken as independent, which is the careful side for one gauge
 * read twice. A loss counts as a leak beyond the larger of tolerance and allowed loss; the two aren't added, since a
 * limit such as ±1 psi already gives the instruments their room.
 *
 * A leak or a rise is told even when the time was too short: waiting can't mend it.
 *
 * @param readings pressures in pascals (gauge; atmosphere absolute), temperatures in kelvin, durations in seconds
 * @returns verdict and figures in pascals with their working, or the reason why there is no verdict
 * @range any pressure above vacuum; nitrogen near room temperature
 * @source Gay-Lussac's law; the leak criterion and the hold are the template's
 * @example judgePressureTest({ 150 psig at 80 °F, 146.9 psig at 70 °F, ±0.5 psi, ±1 °F, held 24 h of 24 h }) // tight
 */
export function judgePressureTest(readings: PressureTestReadings): JudgedPressureTest {
  const expected = expectedTestPressure(readings);
  if (!expected.ok) return expected;
  const refusal = refusalOf(readings);
  if (refusal !== null) return refusal;
  const explainedChangePa = expected.expected - readings.startPressure;
  const unexplainedChangePa = readings.endPressure - expected.expected;
  const tolerancePa = toleranceOf(readings, explainedChangePa);
  const figures = { expected: expected.expected, explainedChangePa, unexplainedChangePa, tolerancePa };
  return {
    ok: true,
    verdict: verdictOf(readings, unexplainedChangePa, tolerancePa),
    ...figures,
    working: workingOf(readings, figures),
  };
}
