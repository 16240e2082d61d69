import { pascalAbsolute, type Metre, type PascalAbsolute } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, standardAtmosphere } from './gauge-pressure';

/**
 * `seaLevelCorrected`: the reading fits a barometer that shows what would be at sea level (a weather report, an altimeter
 * setting) and not what presses on a gauge here. `farFromElevation`: it fits neither.
 */
export type BarometerDoubt = 'seaLevelCorrected' | 'farFromElevation';

export type BarometerResult =
  | {
      readonly ok: true;
      readonly pressure: PascalAbsolute;
      /** To be asked before the reading is used; null when nothing is odd or the elevation isn't known. */
      readonly doubt: BarometerDoubt | null;
      /** With `seaLevelCorrected`, what such a reading means here; else null. */
      readonly uncorrected: PascalAbsolute | null;
    }
  | { readonly ok: false; readonly reason: 'notFinite' | 'belowRange' | 'aboveRange' };

const LOWEST_BAROMETER_PA = 50_000;
const HIGHEST_BAROMETER_PA = 108_000;
/** Weather moves the pressure by about 3 %; what is further off than this is no weather. From memory, no publication. */
const WEATHER = 0.05;

const isWeatherOf = (pressurePa: number, usualPa: number): boolean =>
  Math.abs(pressurePa / usualPa - 1) <= WEATHER;

/**
 * The atmosphere by a barometer on site instead of by elevation.
 *
 * @param reading absolute, in pascals
 * @param elevation of the site in metres, where known: only then can a sea-level-corrected reading be told
 * @returns the reading with what is odd about it, or the reason why it can't be one
 * @range 50 to 108 kPa (from −500 m in high pressure to 5500 m). Below about 400 m a corrected reading can't be told
 *   from weather and makes less of a difference than it
 * @source range and weather: from memory, no publication; usual pressure: see `standardAtmosphere`
 * @example atmosphereFromBarometer(pascalAbsolute(101300), metre(1609)) // doubt seaLevelCorrected, uncorrected 83.4 kPa
 */
export function atmosphereFromBarometer(reading: PascalAbsolute, elevation?: Metre): BarometerResult {
  if (!Number.isFinite(reading)) return { ok: false, reason: 'notFinite' };
  if (reading < LOWEST_BAROMETER_PA) return { ok: false, reason: 'belowRange' };
  if (reading > HIGHEST_BAROMETER_PA) return { ok: false, reason: 'aboveRange' };
  const usual = elevation === undefined ? null : standardAtmosphere(elevation);
  if (usual === null || !usual.ok || isWeatherOf(reading, usual.pressure))
    return { ok: true, pressure: reading, doubt: null, uncorrected: null };
  if (!isWeatherOf(reading, SEA_LEVEL_ATMOSPHERE))
    return { ok: true, pressure: reading, doubt: 'farFromElevation', uncorrected: null };
  const uncorrected = pascalAbsolute((reading * usual.pressure) / SEA_LEVEL_ATMOSPHERE);
  return { ok: true, pressure: reading, doubt: 'seaLevelCorrected', uncorrected };
}
