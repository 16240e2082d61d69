import { convert, toSi } from '../units/convert';
import {
  kelvin,
  kelvinDifference,
  metre,
  pascalGauge,
  type Kelvin,
  type KelvinDifference,
  type PascalAbsolute,
  type PascalGauge,
} from '../units/quantity';
import { standardAtmosphere } from './gauge-pressure';
import { findRefrigerant } from './saturation/refrigerants';
import type { SaturationTable } from './saturation/saturation-table';

// Readings as the trade writes them, for specs.

export const psig = (value: number): PascalGauge => pascalGauge(toSi(value, 'psig'));
export const fahrenheit = (value: number): Kelvin => kelvin(toSi(value, 'degF'));
export const fahrenheitDifference = (value: number): KelvinDifference =>
  kelvinDifference(toSi(value, 'degF_diff'));
export const inFahrenheit = (temperature: Kelvin): number => convert(temperature, 'K', 'degF');
export const inFahrenheitDifference = (difference: KelvinDifference): number =>
  convert(difference, 'K_diff', 'degF_diff');

export function atmosphereAtFeet(feet: number): PascalAbsolute {
  const result = standardAtmosphere(metre(toSi(feet, 'ft')));
  if (!result.ok) throw new Error(result.reason);
  return result.pressure;
}

export function refrigerant(name: string): SaturationTable {
  const table = findRefrigerant(name);
  if (table === undefined) throw new Error(`no table of ${name}`);
  return table;
}
