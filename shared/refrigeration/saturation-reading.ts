import {
  subtractTemperatures,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
} from '../units/quantity';
import { bubbleTemperature, dewTemperature, type SaturationFailure } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';

/** Both saturation temperatures at one pressure. */
export type SaturationReading =
  | { readonly ok: true; readonly dew: Kelvin; readonly bubble: Kelvin; readonly glide: KelvinDifference }
  | { readonly ok: false; readonly reason: SaturationFailure };

/**
 * Dew, bubble and the glide between them at one pressure.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @returns temperatures in kelvin and their difference; the reason when either of the two is outside the table
 * @range where both dew and bubble lie between the table's limits
 * @source the table's `source` and `reference`
 * @example readSaturation(R_448A, pascalAbsolute(411589)) // dew 267.0 K, bubble 260.8 K, glide 6.2 K
 */
export function readSaturation(table: SaturationTable, pressure: PascalAbsolute): SaturationReading {
  const dew = dewTemperature(table, pressure);
  if (!dew.ok) return dew;
  const bubble = bubbleTemperature(table, pressure);
  if (!bubble.ok) return bubble;
  return {
    ok: true,
    dew: dew.temperature,
    bubble: bubble.temperature,
    glide: subtractTemperatures(dew.temperature, bubble.temperature),
  };
}

/** One line of text that names where a table's figures come from, for a `Working`. */
export const sourceOf = (table: SaturationTable): string =>
  `${table.designation}: ${table.source}; ${table.reference}`;
