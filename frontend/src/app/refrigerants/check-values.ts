import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import {
  bubblePressure,
  bubbleTemperature,
  dewPressure,
  dewTemperature,
} from '#shared/refrigeration/saturation/saturation-curve';
import type { SaturationTable } from '#shared/refrigeration/saturation/saturation-table';
import { fromSi, toSi } from '#shared/units/convert';
import { kelvin } from '#shared/units/quantity';
import type { UnitId } from '#shared/units/unit';

/** What a table gives at one round temperature. Absolute pressures. */
export interface CheckValue {
  readonly temperatureK: number;
  readonly bubblePa: number;
  readonly dewPa: number;
  /** From the first bubble to the last drop at the dew pressure; null where the bubble point lies below the table. */
  readonly glideK: number | null;
  /** How much warmer the program's own figures put this dew pressure; null where it has none. */
  readonly ownDifferenceK: number | null;
}

/** A round temperature that is a row's own up to the noise of conversion is that row's. */
function withoutNoise(temperatureK: number, { lowerLimitK, upperLimitK }: SaturationTable): number {
  return [lowerLimitK, upperLimitK].find((limitK) => Math.abs(limitK - temperatureK) < 1e-6) ?? temperatureK;
}

/** Round temperatures between the first and the last row; about ten of them. */
function roundTemperatures(table: SaturationTable, unit: UnitId): number[] {
  const low = fromSi(table.lowerLimitK, unit);
  const high = fromSi(table.upperLimitK, unit);
  const step = [5, 10, 20, 25, 50].find((width) => (high - low) / width <= 11) ?? 100;
  const first = Math.ceil(low / step - 1e-9);
  const count = Math.floor(high / step + 1e-9) - first + 1;
  return Array.from({ length: Math.max(0, count) }, (_, index) => (first + index) * step);
}

/**
 * A few values of a table to hold against the sheet in the hand.
 *
 * @param table as results are worked out with
 * @param unit in which the temperatures are round
 */
export function checkValues(table: SaturationTable, unit: UnitId): CheckValue[] {
  const own = findRefrigerant(table.designation);
  return roundTemperatures(table, unit).flatMap((round) => {
    const temperature = kelvin(withoutNoise(toSi(round, unit), table));
    const bubble = bubblePressure(table, temperature);
    const dew = dewPressure(table, temperature);
    if (!bubble.ok || !dew.ok) return [];
    const firstBubble = bubbleTemperature(table, dew.pressure);
    const ownDew = own && dewTemperature(own, dew.pressure);
    return [
      {
        temperatureK: temperature,
        bubblePa: bubble.pressure,
        dewPa: dew.pressure,
        glideK: firstBubble.ok ? temperature - firstBubble.temperature : null,
        ownDifferenceK: ownDew?.ok ? ownDew.temperature - temperature : null,
      },
    ];
  });
}
