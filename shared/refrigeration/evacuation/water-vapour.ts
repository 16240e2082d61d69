import { pascalAbsolute, type Kelvin, type PascalAbsolute } from '../../units/quantity';

export type WaterPhase = 'liquid' | 'ice';

export type WaterVapourResult =
  | { readonly ok: true; readonly pressure: PascalAbsolute; readonly over: WaterPhase }
  | { readonly ok: false; readonly reason: 'belowRange' | 'aboveRange' | 'notFinite' };

/** Where ice, liquid and vapour of water meet: 0.01 °C. */
export const WATER_TRIPLE_POINT_K = 273.16;

// Limits of the two fits in the paper.
const LOWEST_ICE_K = 110;
const HIGHEST_LIQUID_K = 332;

/** Murphy and Koop 2005, equation 7: over ice, 110 K to the triple point. */
const overIcePa = (t: number): number =>
  Math.exp(9.550426 - 5723.265 / t + 3.53068 * Math.log(t) - 0.00728332 * t);

/** Murphy and Koop 2005, equation 10: over liquid water, 123 to 332 K. */
const overLiquidPa = (t: number): number => {
  const logT = Math.log(t);
  const warm = 54.842763 - 6763.22 / t - 4.21 * logT + 0.000367 * t;
  const cold = 53.878 - 1331.22 / t - 9.44523 * logT + 0.014025 * t;
  return Math.exp(warm + Math.tanh(0.0415 * (t - 218.8)) * cold);
};

/**
 * The vapour pressure of water at a temperature: where an evacuated system stops rising as long as water is left in it.
 * Over ice below the triple point, over liquid from there on.
 *
 * @param temperature of the water, in kelvin
 * @returns absolute pressure in pascals and what it stands over, or the reason why there is none
 * @range 110 K to 332 K (59 °C)
 * @source D. M. Murphy and T. Koop, Review of the vapour pressures of ice and supercooled water for atmospheric
 *   applications, Q. J. R. Meteorol. Soc. 131 (2005) 1539–1565, equations 7 and 10
 * @example waterVapourPressure(70 °F) // 2505 Pa (18 790 µm) over liquid
 */
export function waterVapourPressure(temperature: Kelvin): WaterVapourResult {
  if (!Number.isFinite(temperature)) return { ok: false, reason: 'notFinite' };
  if (temperature < LOWEST_ICE_K) return { ok: false, reason: 'belowRange' };
  if (temperature > HIGHEST_LIQUID_K) return { ok: false, reason: 'aboveRange' };
  return temperature < WATER_TRIPLE_POINT_K
    ? { ok: true, pressure: pascalAbsolute(overIcePa(temperature)), over: 'ice' }
    : { ok: true, pressure: pascalAbsolute(overLiquidPa(temperature)), over: 'liquid' };
}
