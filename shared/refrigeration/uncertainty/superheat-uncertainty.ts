import {
  kelvinDifference,
  pascalAbsolute,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
  type PascalGauge,
} from '../../units/quantity';
import { toAbsolute } from '../gauge-pressure';
import { sourceOf } from '../saturation-reading';
import {
  bubbleTemperature,
  dewTemperature,
  type SaturationFailure,
  type SaturationResult,
} from '../saturation/saturation-curve';
import type { SaturationTable } from '../saturation/saturation-table';
import type { Working, WorkingLine } from '../working';

/** How far a pressure gauge may be off: a fixed amount, or a share of the end of its scale as gauges are classed. */
export type GaugeAccuracy =
  | { readonly kind: 'absolute'; readonly limitPa: number }
  | { readonly kind: 'fullScale'; readonly fraction: number; readonly fullScalePa: number };

export interface InstrumentAccuracy {
  readonly gauge: GaugeAccuracy;
  /** How far the thermometer may be off, probe included. */
  readonly thermometer: KelvinDifference;
}

export interface UncertaintyInputs {
  readonly table: SaturationTable;
  readonly pressure: PascalGauge;
  readonly atmosphere: PascalAbsolute;
  readonly accuracy: InstrumentAccuracy;
}

export type UncertaintyFailure = SaturationFailure | 'negativeAccuracy';

export type UncertaintyResult =
  | {
      readonly ok: true;
      /** Root of the sum of squares: half the width of "4.1 ± 1.6 °F". */
      readonly uncertainty: KelvinDifference;
      /** Both instruments off by all they may be, in the same direction. */
      readonly worstCase: KelvinDifference;
      /** The gauge's share, as a temperature. */
      readonly fromGauge: KelvinDifference;
      /** The thermometer's share. */
      readonly fromThermometer: KelvinDifference;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: UncertaintyFailure };

type CurveReader = (table: SaturationTable, pressure: PascalAbsolute) => SaturationResult;

/** Half the width of the step over which a slope is taken, as a share of the pressure: about 0.25 K. */
const STEP = 0.01;

/**
 * How far a gauge may be off in pascals.
 *
 * @param accuracy as the instrument's sheet states it
 * @returns limit in pascals; NaN when a figure is not a number
 * @example gaugeLimit({ kind: 'fullScale', fraction: 0.01, fullScalePa: 500 psi }) // 5 psi
 */
export const gaugeLimit = (accuracy: GaugeAccuracy): number =>
  accuracy.kind === 'absolute' ? accuracy.limitPa : accuracy.fraction * accuracy.fullScalePa;

/** A slope in kelvin a pascal, or why there is none. */
export type SlopeResult =
  | { readonly ok: true; readonly temperature: Kelvin; readonly slopeKPerPa: number }
  | { readonly ok: false; readonly reason: SaturationFailure };

/** Slope of a saturation curve: over both sides, at an end of the table over the side that is there. */
function slopeOf(read: CurveReader, table: SaturationTable, pressure: PascalAbsolute): SlopeResult {
  const middle = read(table, pressure);
  if (!middle.ok) return middle;
  const sides = [1 - STEP, 1 + STEP].map((factor) => {
    const side = read(table, pascalAbsolute(pressure * factor));
    return side.ok
      ? { pa: pressure * factor, temperature: side.temperature }
      : { pa: pressure, temperature: middle.temperature };
  });
  const [low, high] = sides;
  if (low === undefined || high === undefined || low.pa === high.pa)
    return { ok: false, reason: 'aboveTable' };
  const slopeKPerPa = (high.temperature - low.temperature) / (high.pa - low.pa);
  return { ok: true, temperature: middle.temperature, slopeKPerPa };
}

/**
 * How much the dew temperature moves with the pressure.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @returns kelvin a pascal and the temperature itself, or the reason why there is none
 * @range where `dewTemperature` answers; numeric, over 1 % of the pressure to each side
 * @source the table's `source` and `reference`
 * @example dewSlope(R_404A, 16 psig at sea level) // 1.15e-4 K/Pa: 1.43 °F a psi
 */
export const dewSlope = (table: SaturationTable, pressure: PascalAbsolute): SlopeResult =>
  slopeOf(dewTemperature, table, pressure);

/**
 * How much the bubble temperature moves with the pressure. As `dewSlope`.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @returns kelvin a pascal and the temperature itself, or the reason why there is none
 * @source the table's `source` and `reference`
 * @example bubbleSlope(R_404A, 225 psig at sea level) // 2.4e-5 K/Pa
 */
export const bubbleSlope = (table: SaturationTable, pressure: PascalAbsolute): SlopeResult =>
  slopeOf(bubbleTemperature, table, pressure);

function combine(inputs: UncertaintyInputs, phase: 'dew' | 'bubble'): UncertaintyResult {
  const { table, pressure, atmosphere, accuracy } = inputs;
  const limitPa = gaugeLimit(accuracy.gauge);
  const { thermometer } = accuracy;
  if (!Number.isFinite(limitPa) || !Number.isFinite(thermometer)) return { ok: false, reason: 'notFinite' };
  if (limitPa < 0 || thermometer < 0) return { ok: false, reason: 'negativeAccuracy' };
  const absolutePressure = toAbsolute(pressure, atmosphere);
  const slope = (phase === 'dew' ? dewSlope : bubbleSlope)(table, absolutePressure);
  if (!slope.ok) return slope;
  const fromGauge = kelvinDifference(slope.slopeKPerPa * limitPa);
  const uncertainty = kelvinDifference(Math.hypot(fromGauge, thermometer));
  const worstCase = kelvinDifference(fromGauge + thermometer);
  const lines: WorkingLine[] = [
    { label: 'absolutePressure', value: absolutePressure, unit: 'Pa' },
    { label: `${phase}Temperature`, value: slope.temperature, unit: 'K' },
    { label: 'gaugeAccuracy', value: limitPa, unit: 'Pa_diff' },
    { label: 'fromGauge', value: fromGauge, unit: 'K_diff' },
    { label: 'fromThermometer', value: thermometer, unit: 'K_diff' },
    { label: 'worstCase', value: worstCase, unit: 'K_diff' },
    { label: 'uncertainty', value: uncertainty, unit: 'K_diff' },
  ];
  const formula = phase === 'dew' ? 'superheatUncertainty' : 'subcoolingUncertainty';
  const working: Working = { formula, source: `JCGM 100:2008 (GUM) 5.1.2; ${sourceOf(table)}`, lines };
  return { ok: true, uncertainty, worstCase, fromGauge, fromThermometer: thermometer, working };
}

/**
 * How far a superheat may be off for its instruments alone: the gauge's accuracy through the slope of the dew curve, and
 * the thermometer's, combined as the root of the sum of squares.
 *
 * The law of propagation asks for standard uncertainties. Here both accuracies are taken as limits of the same coverage, so
 * that one common factor stands on both sides of the equation and the result has that same coverage. Not in it: where the
 * pressure was read, contact and insulation of the probe, the table's own error (see its `limitNote`), and the weather's
 * part of the atmosphere.
 *
 * @param inputs gauge and absolute pressures in pascals, accuracies in pascals or as a share of full scale, and in kelvin
 * @returns uncertainty, worst case and both shares in kelvin with the working, or the reason why there are none
 * @range where `dewTemperature` answers; accuracies zero or more
 * @source JCGM 100:2008 (GUM), 5.1.2, for independent quantities (from memory); the table's `source` and `reference`
 * @example superheatUncertainty({ R-404A, 16 psig, sea level, gauge ±2 psi, thermometer ±0 }) // 2.9 °F
 */
export const superheatUncertainty = (inputs: UncertaintyInputs): UncertaintyResult => combine(inputs, 'dew');

/**
 * How far a subcooling may be off for its instruments alone; as `superheatUncertainty`, by the slope of the bubble curve.
 *
 * @param inputs gauge and absolute pressures in pascals, accuracies in pascals or as a share of full scale, and in kelvin
 * @returns uncertainty, worst case and both shares in kelvin with the working, or the reason why there are none
 * @range where `bubbleTemperature` answers; accuracies zero or more
 * @source JCGM 100:2008 (GUM), 5.1.2, for independent quantities (from memory); the table's `source` and `reference`
 * @example subcoolingUncertainty({ R-404A, 225 psig, sea level, gauge ±2 psi, thermometer ±0 }) // 0.6 °F
 */
export const subcoolingUncertainty = (inputs: UncertaintyInputs): UncertaintyResult =>
  combine(inputs, 'bubble');
