import { kelvin, pascalAbsolute, type Kelvin, type PascalAbsolute } from '../../units/quantity';
import { curvesOf, type Curves } from './curves';
import { interpolate } from './interpolate';
import type { SaturationTable } from './saturation-table';

/**
 * Why a curve gives no answer: at or above the critical point there is no saturation; between the table's upper limit and
 * there, or below its first row, it isn't known well enough.
 */
export type SaturationFailure = 'aboveCritical' | 'aboveTable' | 'belowTable' | 'notFinite';

export type SaturationResult =
  | { readonly ok: true; readonly temperature: Kelvin }
  | { readonly ok: false; readonly reason: SaturationFailure };

export type SaturationPressureResult =
  | { readonly ok: true; readonly pressure: PascalAbsolute }
  | { readonly ok: false; readonly reason: SaturationFailure };

interface Failed {
  readonly ok: false;
  readonly reason: SaturationFailure;
}

const FAILED: Readonly<Record<SaturationFailure, Failed>> = {
  aboveCritical: { ok: false, reason: 'aboveCritical' },
  aboveTable: { ok: false, reason: 'aboveTable' },
  belowTable: { ok: false, reason: 'belowTable' },
  notFinite: { ok: false, reason: 'notFinite' },
};

type Phase = 'bubble' | 'dew';

function temperatureAt(table: SaturationTable, phase: Phase, pressure: PascalAbsolute): SaturationResult {
  if (!Number.isFinite(pressure)) return FAILED.notFinite;
  const curves: Curves = curvesOf(table);
  const { logPressures, lowestPa, highestPa } = curves[phase];
  if (pressure < lowestPa) return FAILED.belowTable;
  if (table.criticalPa !== null && pressure >= table.criticalPa) return FAILED.aboveCritical;
  if (pressure > highestPa) return FAILED.aboveTable;
  const inverse = interpolate(logPressures, curves.inverseTemperatures, Math.log(pressure));
  return { ok: true, temperature: kelvin(1 / inverse) };
}

function pressureAt(table: SaturationTable, phase: Phase, temperature: Kelvin): SaturationPressureResult {
  if (!Number.isFinite(temperature)) return FAILED.notFinite;
  if (temperature < table.lowerLimitK) return FAILED.belowTable;
  if (table.criticalK !== null && temperature >= table.criticalK) return FAILED.aboveCritical;
  if (temperature > table.upperLimitK) return FAILED.aboveTable;
  const curves = curvesOf(table);
  // Searching needs ascending values: temperatures ascend, their inverses descend.
  const logPressure = interpolate(curves.negatedInverses, curves[phase].logPressures, -1 / temperature);
  return { ok: true, pressure: pascalAbsolute(Math.exp(logPressure)) };
}

/**
 * The temperature at which the last liquid has evaporated: what superheat is counted from.
 *
 * Method: a straight line of ln p against 1/T between the table's rows, never beyond its limits. Accuracy of the
 * interpolation on a 1 K grid: 0.002 K (every second row left out and predicted from its neighbours, a quarter of that
 * error); of the figures themselves: see the table's `limitNote` and the published points in the spec.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @returns temperature in kelvin, or the reason why there is none
 * @range from the table's lower to its upper limit
 * @source the table's `source` and `reference`
 * @example dewTemperature(R_448A, pascalAbsolute(411589)) // 266.98 K, 20.9 °F
 */
export const dewTemperature = (table: SaturationTable, pressure: PascalAbsolute): SaturationResult =>
  temperatureAt(table, 'dew', pressure);

/**
 * The temperature at which the first bubble forms: what subcooling is counted from. Method, range, accuracy and source
 * as `dewTemperature`.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @returns temperature in kelvin, or the reason why there is none
 * @range from the table's lower to its upper limit
 * @source the table's `source` and `reference`
 * @example bubbleTemperature(R_448A, pascalAbsolute(411589)) // 260.8 K
 */
export const bubbleTemperature = (table: SaturationTable, pressure: PascalAbsolute): SaturationResult =>
  temperatureAt(table, 'bubble', pressure);

/**
 * The pressure of saturated vapour; the exact inverse of `dewTemperature`.
 *
 * @param table of the refrigerant
 * @param temperature in kelvin
 * @returns absolute pressure in pascals, or the reason why there is none
 * @range from the table's lower to its upper limit
 * @source the table's `source` and `reference`
 * @example dewPressure(R_448A, kelvin(255.15)) // 263 kPa absolute
 */
export const dewPressure = (table: SaturationTable, temperature: Kelvin): SaturationPressureResult =>
  pressureAt(table, 'dew', temperature);

/**
 * The pressure of saturated liquid; the exact inverse of `bubbleTemperature`.
 *
 * @param table of the refrigerant
 * @param temperature in kelvin
 * @returns absolute pressure in pascals, or the reason why there is none
 * @range from the table's lower to its upper limit
 * @source the table's `source` and `reference`
 * @example bubblePressure(R_448A, kelvin(255.15)) // 335 kPa absolute
 */
export const bubblePressure = (table: SaturationTable, temperature: Kelvin): SaturationPressureResult =>
  pressureAt(table, 'bubble', temperature);
