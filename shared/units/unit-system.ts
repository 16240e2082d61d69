import type { Dimension, UnitId } from './unit';

/** Which units an opening's screens and papers use. Storage is SI in both. */
export type UnitSystem = 'us' | 'si';

const DISPLAY: Readonly<Record<Dimension, Readonly<Record<UnitSystem, UnitId>>>> = {
  temperature: { us: 'degF', si: 'degC' },
  temperatureDifference: { us: 'degF_diff', si: 'K_diff' },
  gaugePressure: { us: 'psig', si: 'barg' },
  absolutePressure: { us: 'psia', si: 'bara' },
  // Vacuum gauges read microns everywhere.
  vacuum: { us: 'micron', si: 'micron' },
  pressureDifference: { us: 'psi_diff', si: 'bar_diff' },
  length: { us: 'ft', si: 'm' },
  area: { us: 'ft2', si: 'm2' },
  heatFlow: { us: 'BTU_h', si: 'W' },
  mass: { us: 'lb', si: 'kg' },
  duration: { us: 'min', si: 'min' },
  electricCurrent: { us: 'A', si: 'A' },
  voltage: { us: 'V', si: 'V' },
  power: { us: 'W_el', si: 'W_el' },
  ratio: { us: 'percent', si: 'percent' },
  count: { us: 'count', si: 'count' },
};

/**
 * The unit in which a quantity is shown and asked for.
 *
 * @param dimension what is measured
 * @param system of the opening
 * @returns a unit of that dimension
 */
export const displayUnit = (dimension: Dimension, system: UnitSystem): UnitId => DISPLAY[dimension][system];

/** From here on minutes are hard to read: a test stood for 24 h, not for 1440 min. */
const LONG_DURATION_S = 3 * 3600;

/**
 * The unit in which one value is shown: as `displayUnit`, but hours for long durations.
 *
 * @param siValue in the SI unit of the dimension
 * @param dimension what is measured
 * @param system of the opening
 * @returns a unit of that dimension
 * @example displayUnitFor(86400, 'duration', 'us') // 'h'
 */
export const displayUnitFor = (siValue: number, dimension: Dimension, system: UnitSystem): UnitId =>
  dimension === 'duration' && Math.abs(siValue) >= LONG_DURATION_S ? 'h' : displayUnit(dimension, system);
