import {
  kelvin,
  pascalAbsolute,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
} from '../units/quantity';
import { readSaturation, sourceOf } from './saturation-reading';
import { bubblePressure, dewPressure, type SaturationFailure } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';
import type { Working } from './working';

/** Which temperature of a glide is called the evaporating one, with the dew's share in it. */
const DEW_SHARE = { dew: 1, bubble: 0, mean: 0.5, fortySixty: 0.6 } as const;

/**
 * The basis of an evaporating temperature. `dew`: what superheat is counted from. `mean`: halfway between bubble and dew,
 * the usual one for a coil's temperature difference. `fortySixty`: 40 % bubble and 60 % dew, nearer to what a coil feels
 * whose liquid comes in already partly evaporated. `bubble`: never an evaporating temperature, here for comparison.
 */
export type EvaporatingBasis = keyof typeof DEW_SHARE;

export type EvaporatingTemperatureResult =
  | {
      readonly ok: true;
      readonly temperature: Kelvin;
      readonly dew: Kelvin;
      readonly bubble: Kelvin;
      readonly glide: KelvinDifference;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: SaturationFailure };

export type EvaporatingPressureResult =
  | { readonly ok: true; readonly pressure: PascalAbsolute; readonly working: Working }
  | { readonly ok: false; readonly reason: SaturationFailure };

/**
 * A temperature between bubble and dew by a basis.
 *
 * @param bubble in kelvin
 * @param dew in kelvin
 * @param basis of the evaporating temperature
 * @returns temperature in kelvin; NaN when either is not a number
 * @source mean and rule of 40 and 60 per cent: "Mid-point article", HVAC School
 * @example betweenBubbleAndDew(40 °F, 50.8 °F, 'fortySixty') // 46.5 °F
 */
export const betweenBubbleAndDew = (bubble: Kelvin, dew: Kelvin, basis: EvaporatingBasis): Kelvin =>
  kelvin(bubble + DEW_SHARE[basis] * (dew - bubble));

/**
 * The evaporating temperature at a suction pressure, on a named basis.
 *
 * @param table of the refrigerant
 * @param pressure absolute, in pascals
 * @param basis that the schedule or the question goes by
 * @returns temperature, both ends of the glide and the glide in kelvin with the working, or the reason why there is none
 * @range where both dew and bubble lie between the table's limits, whatever the basis
 * @source the table's `source` and `reference`; bases see `betweenBubbleAndDew`
 * @example evaporatingTemperature(R_407C, 80 psig at sea level, 'mean') // 45.3 °F
 */
export function evaporatingTemperature(
  table: SaturationTable,
  pressure: PascalAbsolute,
  basis: EvaporatingBasis,
): EvaporatingTemperatureResult {
  const reading = readSaturation(table, pressure);
  if (!reading.ok) return reading;
  const { dew, bubble, glide } = reading;
  const temperature = betweenBubbleAndDew(bubble, dew, basis);
  const working: Working = {
    formula: `evaporatingTemperature.${basis}`,
    source: sourceOf(table),
    lines: [
      { label: 'absolutePressure', value: pressure, unit: 'Pa' },
      { label: 'bubbleTemperature', value: bubble, unit: 'K' },
      { label: 'dewTemperature', value: dew, unit: 'K' },
      { label: 'glide', value: glide, unit: 'K_diff' },
      { label: 'dewShare', value: DEW_SHARE[basis], unit: 'fraction' },
      { label: 'evaporatingTemperature', value: temperature, unit: 'K' },
    ],
  };
  return { ok: true, temperature, dew, bubble, glide, working };
}

/** Halvings after which an interval of pressures has shrunk below a double's last digit. */
const MOST_HALVINGS = 80;

/** Between the dew pressure (too low for any basis but dew) and the bubble pressure (too high) lies the one that is wanted. */
function searchPressure(
  table: SaturationTable,
  temperature: Kelvin,
  basis: EvaporatingBasis,
): EvaporatingPressureResult | PascalAbsolute {
  const dew = dewPressure(table, temperature);
  if (!dew.ok || basis === 'dew') return dew.ok ? dew.pressure : dew;
  const bubble = bubblePressure(table, temperature);
  if (!bubble.ok || basis === 'bubble') return bubble.ok ? bubble.pressure : bubble;
  let low: number = dew.pressure;
  let high: number = bubble.pressure;
  for (let step = 0; step < MOST_HALVINGS && high > low; step += 1) {
    const middle = pascalAbsolute((low + high) / 2);
    if (middle === low || middle === high) break;
    const reading = readSaturation(table, middle);
    // Near a limit one end of the glide lies beyond the table: no answer rather than half of one.
    if (!reading.ok) return reading;
    if (betweenBubbleAndDew(reading.bubble, reading.dew, basis) < temperature) low = middle;
    else high = middle;
  }
  return pascalAbsolute((low + high) / 2);
}

/**
 * The suction pressure that belongs to a schedule's saturated evaporating temperature; the inverse of
 * `evaporatingTemperature`. On a mean basis the pressure is searched for by halving between dew and bubble pressure.
 *
 * @param table of the refrigerant
 * @param temperature in kelvin
 * @param basis that the schedule goes by: ask, since half the glide of R-448A is 5 °F
 * @returns absolute pressure in pascals with the working, or the reason why there is none
 * @range where both dew and bubble lie between the table's limits at that pressure
 * @source the table's `source` and `reference`; bases see `betweenBubbleAndDew`
 * @example evaporatingPressure(R_448A, 20 °F, 'dew') // 43.9 psig at sea level; on 'mean' 50.6 psig
 */
export function evaporatingPressure(
  table: SaturationTable,
  temperature: Kelvin,
  basis: EvaporatingBasis,
): EvaporatingPressureResult {
  const found = searchPressure(table, temperature, basis);
  if (typeof found !== 'number') return found;
  const reading = evaporatingTemperature(table, found, basis);
  if (!reading.ok) return reading;
  const working: Working = {
    formula: `evaporatingPressure.${basis}`,
    source: sourceOf(table),
    lines: [
      { label: 'evaporatingTemperature', value: temperature, unit: 'K' },
      { label: 'dewShare', value: DEW_SHARE[basis], unit: 'fraction' },
      { label: 'bubbleTemperature', value: reading.bubble, unit: 'K' },
      { label: 'dewTemperature', value: reading.dew, unit: 'K' },
      { label: 'glide', value: reading.glide, unit: 'K_diff' },
      { label: 'absolutePressure', value: found, unit: 'Pa' },
    ],
  };
  return { ok: true, pressure: found, working };
}
