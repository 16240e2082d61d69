import { kelvin, pascalAbsolute, type PascalAbsolute } from '../../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from '../gauge-pressure';
import { bubblePressure, dewPressure } from '../saturation/saturation-curve';
import type { SaturationTable } from '../saturation/saturation-table';
import type { MakersPoint, MakersTable } from './makers-table';

/** A tenth of a psi, exactly. */
export const TENTH_PSI_PA = 689.4757293168;

/** How a sheet is printed: rows apart, first row above the table's lowest one, last digit (0 prints all digits). */
export interface Printing {
  readonly stepK: number;
  readonly offsetK?: number;
  readonly lastDigitPa?: number;
  /** Coldest row; a real sheet seldom begins below −60 °C. */
  readonly fromK?: number;
  readonly toK?: number;
}

const printed = (pressure: PascalAbsolute, lastDigitPa: number): PascalAbsolute => {
  if (lastDigitPa === 0) return pressure;
  const gauge = Math.round((pressure - SEA_LEVEL_ATMOSPHERE) / lastDigitPa) * lastDigitPa;
  return pascalAbsolute(gauge + SEA_LEVEL_ATMOSPHERE);
};

/** Rows of a shipped table as a maker would print them, up to 5 K below the critical point. */
export function printedPoints(table: SaturationTable, printing: Printing): MakersPoint[] {
  const { stepK, offsetK = 0, lastDigitPa = 0, fromK = table.lowerLimitK, toK = Infinity } = printing;
  const lastK = Math.min(table.upperLimitK, (table.criticalK ?? Infinity) - 5, toK);
  const points: MakersPoint[] = [];
  for (
    let temperatureK = Math.max(table.lowerLimitK, fromK) + offsetK;
    temperatureK <= lastK;
    temperatureK += stepK
  ) {
    const bubble = bubblePressure(table, kelvin(temperatureK));
    const dew = dewPressure(table, kelvin(temperatureK));
    if (!bubble.ok || !dew.ok) continue;
    points.push({
      temperature: kelvin(temperatureK),
      bubble: printed(bubble.pressure, lastDigitPa),
      dew: printed(dew.pressure, lastDigitPa),
    });
  }
  return points;
}

export const makersTable = (points: readonly MakersPoint[], designation = 'R-999X'): MakersTable => ({
  designation,
  issuer: 'a maker',
  edition: '2026-01',
  points,
});

/** The same points with one of them changed; rows count from 1. */
export const changed = (
  points: readonly MakersPoint[],
  row: number,
  change: (point: MakersPoint) => Partial<MakersPoint>,
): MakersPoint[] =>
  points.map((point, index) => (index === row - 1 ? { ...point, ...change(point) } : point));
