import { interpolate } from './interpolate';
import type { SaturationTable } from './saturation-table';

/** One phase of a table, ready to be searched. */
export interface Curve {
  /** Natural logarithms of the pressures in pascals, ascending. */
  readonly logPressures: Float64Array;
  /** Pressure at the table's lower limit, absolute. */
  readonly lowestPa: number;
  /** Pressure at the table's upper limit, absolute. */
  readonly highestPa: number;
}

/** Both phases of a table over the inverse of temperature. */
export interface Curves {
  /** 1/T in 1/K, descending as the pressures ascend. */
  readonly inverseTemperatures: Float64Array;
  /** −1/T in 1/K, ascending. */
  readonly negatedInverses: Float64Array;
  readonly bubble: Curve;
  readonly dew: Curve;
}

// A limit's own pressure must still be answered after a logarithm and its inverse.
const ROUNDING = 1e-12;

function temperaturesOf({ temperaturesK, dewPa }: SaturationTable): readonly number[] {
  if (!('startK' in temperaturesK)) return temperaturesK;
  const { startK, stepK } = temperaturesK;
  return dewPa.map((_, row) => startK + row * stepK);
}

function prepare(table: SaturationTable): Curves {
  const inverseTemperatures = Float64Array.from(temperaturesOf(table), (temperature) => 1 / temperature);
  const negatedInverses = inverseTemperatures.map((inverse) => -inverse);
  const curve = (pressures: readonly number[]): Curve => {
    const logPressures = Float64Array.from(pressures, (pressure) => Math.log(pressure));
    const pressureAt = (temperatureK: number): number =>
      Math.exp(interpolate(negatedInverses, logPressures, -1 / temperatureK));
    return {
      logPressures,
      lowestPa: pressureAt(table.lowerLimitK) * (1 - ROUNDING),
      highestPa: pressureAt(table.upperLimitK) * (1 + ROUNDING),
    };
  };
  return { inverseTemperatures, negatedInverses, bubble: curve(table.bubblePa), dew: curve(table.dewPa) };
}

const prepared = new WeakMap<SaturationTable, Curves>();

/**
 * The logarithms that reading a table takes, worked out at its first use and kept as long as the table itself.
 *
 * @param table of a refrigerant, never changed afterwards
 * @returns the curves; the same object for the same table
 */
export function curvesOf(table: SaturationTable): Curves {
  const known = prepared.get(table);
  if (known !== undefined) return known;
  const curves = prepare(table);
  prepared.set(table, curves);
  return curves;
}
