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

export interface SuperheatInputs {
  readonly table: SaturationTable;
  /** At the coil's outlet, near the bulb. */
  readonly suctionPressure: PascalGauge;
  /** The opening's atmosphere, from its elevation. */
  readonly atmosphere: PascalAbsolute;
  /** On the suction line at the bulb. */
  readonly lineTemperature: Kelvin;
}

export type SuperheatResult =
  | {
      readonly ok: true;
      readonly superheat: KelvinDifference;
      /** Dew temperature at the suction pressure. */
      readonly saturation: Kelvin;
      /** Dew minus bubble at the suction pressure. */
      readonly glide: KelvinDifference;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: SaturationFailure | 'belowAbsoluteZero' };

/**
 * Superheat at a coil: line temperature minus **dew** temperature, never the bubble or the mean. Zero and negative values
 * come back as they are; they mean wet gas or a wrong reading and are never a pass.
 *
 * @param inputs gauge and absolute pressures in pascals, line temperature in kelvin
 * @returns superheat in kelvin with its working, or the reason why there is none
 * @range both saturation temperatures within the table's limits, line temperature above absolute zero
 * @source the table's `source` and `reference`; accuracy see `dewTemperature`
 * @example superheat({ table: R_448A, suctionPressure: 45 psig, atmosphere: 1 atm, lineTemperature: 28 °F }) // 7.1 °F
 */
export function superheat(inputs: SuperheatInputs): SuperheatResult {
  const { table, suctionPressure, atmosphere, lineTemperature } = inputs;
  if (!Number.isFinite(lineTemperature)) return { ok: false, reason: 'notFinite' };
  if (lineTemperature <= 0) return { ok: false, reason: 'belowAbsoluteZero' };
  const absolutePressure = toAbsolute(suctionPressure, atmosphere);
  const reading = readSaturation(table, absolutePressure);
  if (!reading.ok) return reading;
  const { dew, bubble, glide } = reading;
  const value = subtractTemperatures(lineTemperature, dew);
  const working: Working = {
    formula: 'superheatFromDew',
    source: sourceOf(table),
    lines: [
      { label: 'suctionPressure', value: suctionPressure, unit: 'Pag' },
      { label: 'atmosphere', value: atmosphere, unit: 'Pa' },
      { label: 'absolutePressure', value: absolutePressure, unit: 'Pa' },
      { label: 'bubbleTemperature', value: bubble, unit: 'K' },
      { label: 'dewTemperature', value: dew, unit: 'K' },
      { label: 'glide', value: glide, unit: 'K_diff' },
      { label: 'lineTemperature', value: lineTemperature, unit: 'K' },
      { label: 'superheat', value, unit: 'K_diff' },
    ],
  };
  return { ok: true, superheat: value, saturation: dew, glide, working };
}
