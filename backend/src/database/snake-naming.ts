import { DefaultNamingStrategy, type NamingStrategyInterface } from 'typeorm';

/** camelCase to snake_case: `dischargeAirTemperatureK` is the column `discharge_air_temperature_k`. */
export function snakeCase(name: string): string {
  return name
    .replace(/([a-z0-9])([A-Z])/g, '$1_$2')
    .replace(/([A-Z])([A-Z][a-z])/g, '$1_$2')
    .toLowerCase();
}

/** Column names follow property names, so that a field has one name from the contract down to the table. */
export class SnakeNaming extends DefaultNamingStrategy implements NamingStrategyInterface {
  override columnName(propertyName: string, customName: string | undefined, prefixes: string[]): string {
    return [...prefixes.map(snakeCase), customName ?? snakeCase(propertyName)].join('_');
  }
}
