import { fromSi } from './convert';
import { roundTo } from './round';
import { UNITS, type UnitId } from './unit';

/** Languages in which numbers are written. */
export type NumberLocale = 'en' | 'es';

const MINUS = '\u2212';

const DECIMALS: Readonly<Record<UnitId, number>> = {
  degC: 1,
  degF: 1,
  K: 2,
  K_diff: 1,
  degF_diff: 1,
  degC_diff: 1,
  psig: 1,
  barg: 2,
  kPag: 0,
  Pag: 0,
  psia: 2,
  bara: 3,
  kPaa: 1,
  Pa: 0,
  inHg: 2,
  micron: 0,
  Torr: 2,
  Pa_vac: 1,
  psi_diff: 1,
  bar_diff: 3,
  kPa_diff: 1,
  Pa_diff: 0,
  m: 2,
  ft: 1,
  in: 1,
  m2: 1,
  ft2: 0,
  W: 0,
  kW: 2,
  BTU_h: 0,
  MBH: 1,
  ton: 2,
  kg: 2,
  lb: 2,
  oz: 1,
  s: 0,
  min: 0,
  h: 1,
  A: 1,
  V: 0,
  W_el: 0,
  kW_el: 2,
  percent: 1,
  fraction: 3,
  count: 0,
};

/**
 * How many decimals a value in this unit is shown with: about what the trade's instruments resolve.
 *
 * @param unit in which the value is shown
 * @returns number of decimals, 0 to 3
 */
export const decimalsFor = (unit: UnitId): number => DECIMALS[unit];

/**
 * Writes a number with exactly so many decimals, a real minus sign (U+2212) and no thousands separators: "1,234" means
 * two things to two readers.
 *
 * @param value any number
 * @param decimals whole number, 0 or more
 * @param _locale English and the Spanish of North America both take a decimal point, as the instruments on site do
 * @returns text, an em dash for NaN and infinities; what rounds to zero has no sign
 * @example formatNumber(-3.25, 1, 'es') // '−3.3'
 */
export function formatNumber(value: number, decimals: number, _locale: NumberLocale): string {
  if (!Number.isFinite(value)) return '—';
  const rounded = roundTo(value, decimals);
  const digits = Math.abs(rounded).toFixed(decimals);
  return `${rounded < 0 ? MINUS : ''}${digits}`;
}

/**
 * Writes a stored quantity for people, with its unit.
 *
 * @param siValue in the SI unit of the unit's dimension
 * @param unit to show it in
 * @param locale of the reader
 * @returns such as "20.9 °F"; the number alone for a count or a fraction
 * @example formatQuantity(266.98, 'degF', 'en') // '20.9 °F'
 */
export function formatQuantity(siValue: number, unit: UnitId, locale: NumberLocale): string {
  const text = formatNumber(fromSi(siValue, unit), decimalsFor(unit), locale);
  const { symbol } = UNITS[unit];
  return symbol === '' ? text : `${text} ${symbol}`;
}
