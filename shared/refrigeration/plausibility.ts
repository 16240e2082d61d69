import { toSi } from '../units/convert';
import type { Kelvin, PascalAbsolute, PascalGauge } from '../units/quantity';
import { toAbsolute } from './gauge-pressure';
import { dewTemperature } from './saturation/saturation-curve';
import type { SaturationTable } from './saturation/saturation-table';

/**
 * What is odd about a reading, as a key that screens translate. `swapped`: the two numbers would fit if exchanged, and
 * don't as typed. `celsiusInFahrenheit`, `fahrenheitInCelsius`: the temperature fits only in the other unit.
 */
export type DoubtKind =
  | 'notFinite'
  | 'belowAbsoluteZero'
  | 'deeperThanVacuum'
  | 'aboveCritical'
  | 'notPlausible'
  | 'swapped'
  | 'celsiusInFahrenheit'
  | 'fahrenheitInCelsius';

/** `refuse`: physically impossible. `ask`: possible, so a person may insist. */
export interface Doubt {
  readonly kind: DoubtKind;
  readonly severity: 'refuse' | 'ask';
  readonly about: 'pressure' | 'temperature' | 'both';
}

/** A closed range of SI values. */
interface Range {
  readonly from: number;
  readonly to: number;
}

const celsius = (from: number, to: number): Range => ({ from: toSi(from, 'degC'), to: toSi(to, 'degC') });

// Wide on purpose (from experience, no publication): a standing store in summer, a starved coil and a flooded one are real.
const LINE_TEMPERATURE = celsius(-65, 60);
const DEW_TEMPERATURE = celsius(-60, 30);

const isIn = (value: number, range: Range): boolean => value >= range.from && value <= range.to;

/**
 * Whether a suction line can be this cold or warm.
 *
 * @param temperature in kelvin
 * @returns null when plausible; a refusal at or below absolute zero or for no number; a question outside −65 to 60 °C
 * @source experience, no publication
 * @example plausibleLineTemperature(kelvin(400)) // { kind: 'notPlausible', severity: 'ask', about: 'temperature' }
 */
export function plausibleLineTemperature(temperature: Kelvin): Doubt | null {
  const about = 'temperature';
  if (!Number.isFinite(temperature)) return { kind: 'notFinite', severity: 'refuse', about };
  if (temperature <= 0) return { kind: 'belowAbsoluteZero', severity: 'refuse', about };
  return isIn(temperature, LINE_TEMPERATURE) ? null : { kind: 'notPlausible', severity: 'ask', about };
}

/**
 * Whether a running coil of this refrigerant can have this suction pressure.
 *
 * @param table of the refrigerant
 * @param pressure gauge, in pascals
 * @param atmosphere absolute, in pascals
 * @returns null when plausible; a refusal for no number, at or below a perfect vacuum, and from the critical pressure
 *   on; a question where the dew temperature is outside −60 to 30 °C or outside the table
 * @source experience, no publication
 * @example plausibleSuctionPressure(R_448A, pascalGauge(-2e5), SEA_LEVEL_ATMOSPHERE) // refuses: deeperThanVacuum
 */
export function plausibleSuctionPressure(
  table: SaturationTable,
  pressure: PascalGauge,
  atmosphere: PascalAbsolute,
): Doubt | null {
  const about = 'pressure';
  const absolute = toAbsolute(pressure, atmosphere);
  if (!Number.isFinite(absolute)) return { kind: 'notFinite', severity: 'refuse', about };
  if (absolute <= 0) return { kind: 'deeperThanVacuum', severity: 'refuse', about };
  const dew = dewTemperature(table, absolute);
  if (dew.ok && isIn(dew.temperature, DEW_TEMPERATURE)) return null;
  if (!dew.ok && dew.reason === 'aboveCritical') return { kind: 'aboveCritical', severity: 'refuse', about };
  return { kind: 'notPlausible', severity: 'ask', about };
}
