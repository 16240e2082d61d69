/**
 * What kind of quantity a unit measures. A temperature and a temperature difference are two dimensions, so are gauge
 * and absolute pressure, and an evacuation reading (absolute, but read in microns) is a third kind of pressure.
 * A pressure difference (a loss, a line drop, a gauge's accuracy) is neither gauge nor absolute. Electric
 * `power` is apart from `heatFlow`: both are watts, but nobody reads a heater in BTU/h.
 */
export type Dimension =
  | 'temperature'
  | 'temperatureDifference'
  | 'gaugePressure'
  | 'absolutePressure'
  | 'vacuum'
  | 'pressureDifference'
  | 'length'
  | 'area'
  | 'heatFlow'
  | 'mass'
  | 'duration'
  | 'electricCurrent'
  | 'voltage'
  | 'power'
  | 'ratio'
  | 'count';

/** A unit as stored in templates, entries and columns. Each belongs to exactly one dimension. */
export type UnitId =
  | 'degC'
  | 'degF'
  | 'K'
  | 'K_diff'
  | 'degF_diff'
  | 'degC_diff'
  | 'psig'
  | 'barg'
  | 'kPag'
  | 'Pag'
  | 'psia'
  | 'bara'
  | 'kPaa'
  | 'Pa'
  | 'inHg'
  | 'micron'
  | 'Torr'
  | 'Pa_vac'
  | 'psi_diff'
  | 'bar_diff'
  | 'kPa_diff'
  | 'Pa_diff'
  | 'm'
  | 'ft'
  | 'in'
  | 'm2'
  | 'ft2'
  | 'W'
  | 'kW'
  | 'BTU_h'
  | 'MBH'
  | 'ton'
  | 'kg'
  | 'lb'
  | 'oz'
  | 's'
  | 'min'
  | 'h'
  | 'A'
  | 'V'
  | 'W_el'
  | 'kW_el'
  | 'percent'
  | 'fraction'
  | 'count';

/** How a unit relates to the SI unit of its dimension: SI value = (value + offset) × factor. */
export interface Unit {
  readonly dimension: Dimension;
  /** What people read. A difference in °F shows as °F too; only its dimension tells them apart. Empty for a count. */
  readonly symbol: string;
  readonly factor: number;
  readonly offset: number;
}

// Exact by definition: foot, pound and standard gravity (NIST SP 811:2008, appendix B), the International Table BTU
// (1055.05585262 J), the standard atmosphere (101325 Pa), the torr (1/760 of it).
const METRES_PER_FOOT = 0.3048;
const METRES_PER_INCH = 0.0254;
const KILOGRAMS_PER_POUND = 0.45359237;
const STANDARD_GRAVITY = 9.80665;
const PASCALS_PER_PSI = (KILOGRAMS_PER_POUND * STANDARD_GRAVITY) / METRES_PER_INCH ** 2;
const PASCALS_PER_TORR = 101325 / 760;
const WATTS_PER_BTU_H = 1055.05585262 / 3600;

const unit = (dimension: Dimension, symbol: string, factor: number, offset = 0): Unit => ({
  dimension,
  symbol,
  factor,
  offset,
});

/**
 * Every unit with its exact factor to SI: K, Pa (gauge or absolute; vacuum is absolute), m, m², W, kg, s, A, V, and for a
 * ratio the fraction. Sources: NIST SP 811 (2008) appendix B, and the definitions named above; the inch of mercury
 * is the conventional one (NIST SP 811: 3386.389 Pa).
 */
export const UNITS: Readonly<Record<UnitId, Unit>> = {
  degC: unit('temperature', '°C', 1, 273.15),
  degF: unit('temperature', '°F', 5 / 9, 459.67),
  K: unit('temperature', 'K', 1),
  K_diff: unit('temperatureDifference', 'K', 1),
  degF_diff: unit('temperatureDifference', '°F', 5 / 9),
  degC_diff: unit('temperatureDifference', '°C', 1),
  psig: unit('gaugePressure', 'psig', PASCALS_PER_PSI),
  barg: unit('gaugePressure', 'bar(g)', 1e5),
  kPag: unit('gaugePressure', 'kPa(g)', 1e3),
  Pag: unit('gaugePressure', 'Pa(g)', 1),
  psia: unit('absolutePressure', 'psia', PASCALS_PER_PSI),
  bara: unit('absolutePressure', 'bar(a)', 1e5),
  kPaa: unit('absolutePressure', 'kPa(a)', 1e3),
  Pa: unit('absolutePressure', 'Pa', 1),
  inHg: unit('absolutePressure', 'inHg', 3386.389),
  micron: unit('vacuum', 'µm Hg', PASCALS_PER_TORR / 1000),
  Torr: unit('vacuum', 'Torr', PASCALS_PER_TORR),
  Pa_vac: unit('vacuum', 'Pa', 1),
  psi_diff: unit('pressureDifference', 'psi', PASCALS_PER_PSI),
  bar_diff: unit('pressureDifference', 'bar', 1e5),
  kPa_diff: unit('pressureDifference', 'kPa', 1e3),
  Pa_diff: unit('pressureDifference', 'Pa', 1),
  m: unit('length', 'm', 1),
  ft: unit('length', 'ft', METRES_PER_FOOT),
  in: unit('length', 'in', METRES_PER_INCH),
  m2: unit('area', 'm²', 1),
  ft2: unit('area', 'ft²', METRES_PER_FOOT ** 2),
  W: unit('heatFlow', 'W', 1),
  kW: unit('heatFlow', 'kW', 1000),
  BTU_h: unit('heatFlow', 'BTU/h', WATTS_PER_BTU_H),
  MBH: unit('heatFlow', 'MBH', 1000 * WATTS_PER_BTU_H),
  ton: unit('heatFlow', 'tons', 12000 * WATTS_PER_BTU_H),
  kg: unit('mass', 'kg', 1),
  lb: unit('mass', 'lb', KILOGRAMS_PER_POUND),
  oz: unit('mass', 'oz', KILOGRAMS_PER_POUND / 16),
  s: unit('duration', 's', 1),
  min: unit('duration', 'min', 60),
  h: unit('duration', 'h', 3600),
  A: unit('electricCurrent', 'A', 1),
  V: unit('voltage', 'V', 1),
  W_el: unit('power', 'W', 1),
  kW_el: unit('power', 'kW', 1000),
  percent: unit('ratio', '%', 0.01),
  fraction: unit('ratio', '', 1),
  count: unit('count', '', 1),
};
