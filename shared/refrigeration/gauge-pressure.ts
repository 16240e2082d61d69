import {
  pascalAbsolute,
  pascalGauge,
  type Metre,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';

export type AtmosphereResult =
  | { readonly ok: true; readonly pressure: PascalAbsolute }
  | { readonly ok: false; readonly reason: 'belowRange' | 'aboveRange' | 'notFinite' };

/** The standard atmosphere at sea level: 101325 Pa, exact by definition. */
export const SEA_LEVEL_ATMOSPHERE = pascalAbsolute(101325);

const LOWEST_ELEVATION_M = -500;
const HIGHEST_ELEVATION_M = 11000;

/**
 * The pressure of the atmosphere at an elevation on a standard day. Weather moves the true one by about 3 %.
 *
 * Method: p = 101325 Pa · (1 − 2.25577e-5 · h)^5.25588, taking the elevation as geopotential height (0.02 % apart at
 * 10 000 ft).
 *
 * @param elevation above sea level, in metres
 * @returns absolute pressure in pascals, or the reason why there is none
 * @range −500 m to 11 000 m; outside it the result says `belowRange` or `aboveRange`
 * @source US Standard Atmosphere 1976, troposphere
 * @example standardAtmosphere(metre(1609.344)) // 83.43 kPa, 12.100 psia
 */
export function standardAtmosphere(elevation: Metre): AtmosphereResult {
  if (!Number.isFinite(elevation)) return { ok: false, reason: 'notFinite' };
  if (elevation < LOWEST_ELEVATION_M) return { ok: false, reason: 'belowRange' };
  if (elevation > HIGHEST_ELEVATION_M) return { ok: false, reason: 'aboveRange' };
  return {
    ok: true,
    pressure: pascalAbsolute(SEA_LEVEL_ATMOSPHERE * (1 - 2.25577e-5 * elevation) ** 5.25588),
  };
}

/**
 * What a gauge reading is above a perfect vacuum.
 *
 * @param gauge reading in pascals; negative in a vacuum
 * @param atmosphere where the gauge was zeroed, absolute, in pascals
 * @returns absolute pressure in pascals; below zero when the reading is deeper than a vacuum can be, the caller checks
 * @example toAbsolute(pascalGauge(0), SEA_LEVEL_ATMOSPHERE) // 101325
 */
export const toAbsolute = (gauge: PascalGauge, atmosphere: PascalAbsolute): PascalAbsolute =>
  pascalAbsolute(gauge + atmosphere);

/**
 * What a gauge would show; the opposite of `toAbsolute`.
 *
 * @param absolute pressure in pascals
 * @param atmosphere where the gauge was zeroed, absolute, in pascals
 * @returns gauge pressure in pascals; negative in a vacuum
 * @example toGauge(pascalAbsolute(0), SEA_LEVEL_ATMOSPHERE) // -101325
 */
export const toGauge = (absolute: PascalAbsolute, atmosphere: PascalAbsolute): PascalGauge =>
  pascalGauge(absolute - atmosphere);
