import {
  subtractTemperatures,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';
import { toAbsolute } from './gauge-pressure';
import { readSaturation, sourceOf } from './saturation-reading';
import type { SaturationFailure } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';
import type { Working } from './working';

export interface SubcoolingInputs {
  readonly table: SaturationTable;
  readonly liquidPressure: PascalGauge;
  /** The opening's atmosphere, from its elevation. */
  readonly atmosphere: PascalAbsolute;
  /** On the liquid line, where the pressure was read. */
  readonly lineTemperature: Kelvin;
}

export type SubcoolingResult =
  | {
      readonly ok: true;
      readonly subcooling: KelvinDifference;
      /** Bubble temperature at the liquid pressure. */
      readonly saturation: Kelvin;
      /** Dew minus bubble at the liquid pressure. */
      readonly glide: KelvinDifference;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: SaturationFailure | 'belowAbsoluteZero' };

/**
 * Subcooling of a liquid line: **bubble** temperature minus line temperature. Negative values come back as they are; they
 * mean flash gas or a wrong reading.
 *
 * @param inputs gauge and absolute pressures in pascals, line temperature in kelvin
 * @returns subcooling in kelvin with its working, or the reason why there is none
 * @range both saturation temperatures within the table's limits, line temperature above absolute zero
 * @source the table's `source` and `reference`; accuracy see `dewTemperature`
 * @example subcooling({ table: R_404A, liquidPressure: 225 psig, atmosphere: 1 atm, lineTemperature: 86 °F }) // 10.5 °F
 */
export function subcooling(inputs: SubcoolingInputs): SubcoolingResult {
  const { table, liquidPressure, atmosphere, lineTemperature } = inputs;
  if (!Number.isFinite(lineTemperature)) return { ok: false, reason: 'notFinite' };
  if (lineTemperature <= 0) return { ok: false, reason: 'belowAbsoluteZero' };
  const absolutePressure = toAbsolute(liquidPressure, atmosphere);
  const reading = readSaturation(table, absolutePressure);
  if (!reading.ok) return reading;
  const { dew, bubble, glide } = reading;
  const value = subtractTemperatures(bubble, lineTemperature);
  const working: Working = {
    formula: 'subcoolingFromBubble',
    source: sourceOf(table),
    lines: [
      { label: 'liquidPressure', value: liquidPressure, unit: 'Pag' },
      { label: 'atmosphere', value: atmosphere, unit: 'Pa' },
      { label: 'absolutePressure', value: absolutePressure, unit: 'Pa' },
      { label: 'dewTemperature', value: dew, unit: 'K' },
      { label: 'bubbleTemperature', value: bubble, unit: 'K' },
      { label: 'glide', value: glide, unit: 'K_diff' },
      { label: 'lineTemperature', value: lineTemperature, unit: 'K' },
      { label: 'subcooling', value, unit: 'K_diff' },
    ],
  };
  return { ok: true, subcooling: value, saturation: bubble, glide, working };
}
