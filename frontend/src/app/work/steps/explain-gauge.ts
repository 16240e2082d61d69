import type { SequenceFacts } from '#shared/checklist/facts';
import { saturationOf } from '#shared/checklist/saturation-of';
import { readTypedValue } from '#shared/checklist/typed-value';
import {
  elevationShift,
  gaugeTemperatureDifference,
  toAbsoluteByGauge,
  type GaugeDifferenceCause,
} from '#shared/refrigeration/gauge-kind';
import { toGauge } from '#shared/refrigeration/gauge-pressure';
import { bubbleTemperature, dewTemperature } from '#shared/refrigeration/saturation/saturation-curve';
import { pascalAbsolute, subtractTemperatures } from '#shared/units/quantity';
import { displayUnit } from '#shared/units/unit-system';
import type { TypedInstruments } from './superheat-typed';

export interface ExplainedLine {
  /** Of the words. */
  readonly key: string;
  readonly valueK: number;
  readonly dimension: 'temperature' | 'temperatureDifference';
}

export interface ExplainedGauge {
  readonly cause: GaugeDifferenceCause;
  /**
   * How far off the gauge's own dew temperature is, in kelvin and whichever way; of a sealed gauge how far off it would be
   * if it were taken for a vented one.
   */
  readonly differenceK: number;
  readonly lines: readonly ExplainedLine[];
}

/**
 * What the gauge's own temperature differs by at this store, and what the refrigerant has between dew and bubble.
 *
 * @param pressureText as typed, in the opening's unit
 * @returns `null` while there is no pressure, or one outside the table
 */
export function explainGauge(
  pressureText: string,
  kind: TypedInstruments['gauge'],
  facts: SequenceFacts,
): ExplainedGauge | null {
  const table = saturationOf(facts);
  const unit = displayUnit('gaugePressure', facts.unitSystem);
  const typed = readTypedValue({ text: pressureText, unit }, 'gaugePressure');
  if (!table || !typed.ok) return null;
  const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
  const reading = { kind, readingPa: typed.si, atmosphere };
  const truth = toAbsoluteByGauge(reading);
  if (!truth.ok) return null;
  const dew = dewTemperature(table, truth.pressure);
  const bubble = bubbleTemperature(table, truth.pressure);
  const difference = gaugeTemperatureDifference(table, reading);
  const shift = elevationShift(table, toGauge(truth.pressure, atmosphere), atmosphere);
  if (!dew.ok || !bubble.ok || !difference.ok || !shift.ok) return null;
  const glideK = subtractTemperatures(dew.temperature, bubble.temperature);
  // A sealed gauge is right and read as such here: its own temperature is this page's.
  const offK = difference.cause === 'assumesSeaLevel' ? difference.difference : 0;
  return {
    cause: difference.cause,
    differenceK: Math.abs(difference.difference),
    lines: [
      { key: 'gaugeOwnDew', valueK: dew.temperature + offK, dimension: 'temperature' },
      { key: 'saturation', valueK: dew.temperature, dimension: 'temperature' },
      { key: 'gaugeShift', valueK: shift.shift, dimension: 'temperatureDifference' },
      { key: 'gaugeBubble', valueK: bubble.temperature, dimension: 'temperature' },
      { key: 'gaugeGlide', valueK: glideK, dimension: 'temperatureDifference' },
    ],
  };
}
