import { convert } from '../../units/convert';
import { UNITS, type Dimension, type UnitId } from '../../units/unit';
import { headingQuantity, type HeadingQuantity } from './heading-unit';
import type { LoggerColumn, LoggerFile } from './logger-file';

/** What a logger's column can be picked for. */
export type PickedDimension = Extract<
  Dimension,
  'gaugePressure' | 'absolutePressure' | 'temperature' | 'temperatureDifference'
>;

/** A column that may be the one, and what says so. */
export interface ColumnCandidate {
  readonly column: LoggerColumn;
  /** Index among the file's columns. */
  readonly index: number;
  readonly by: 'unitAndHeading' | 'unit' | 'heading';
}

const QUANTITY: Readonly<Record<PickedDimension, HeadingQuantity>> = {
  gaugePressure: 'pressure',
  absolutePressure: 'pressure',
  temperature: 'temperature',
  temperatureDifference: 'superheat',
};

const RANK: Readonly<Record<ColumnCandidate['by'], number>> = { unitAndHeading: 0, unit: 1, heading: 2 };

function evidence({ heading, unit }: LoggerColumn, dimension: PickedDimension): ColumnCandidate['by'] | null {
  const isNamed = headingQuantity(heading) === QUANTITY[dimension];
  // A unit of something else outweighs the words: "Temperature alarm (V)" is no temperature.
  if (unit === null) return isNamed ? 'heading' : null;
  if (UNITS[unit].dimension !== dimension) return null;
  return isNamed ? 'unitAndHeading' : 'unit';
}

/**
 * Columns that may hold a quantity, the best supported first and otherwise in the file's order. A person picks.
 *
 * @param file as read
 * @param dimension wanted; gauge and absolute pressures are two
 * @returns candidates by unit or, where the heading names no unit, by its words in English or Spanish; maybe none
 * @example pickColumn(file, 'gaugePressure') // [{ column: 'Suction pressure (psig)', index: 0, by: 'unitAndHeading' }]
 */
export function pickColumn(file: LoggerFile, dimension: PickedDimension): ColumnCandidate[] {
  return file.columns
    .flatMap((column, index) => {
      const by = evidence(column, dimension);
      return by === null ? [] : [{ column, index, by }];
    })
    .sort((a, b) => RANK[a.by] - RANK[b.by] || a.index - b.index);
}

/**
 * A column's values in another unit of the same dimension, such as `Pag` or `K`.
 *
 * @param column as read
 * @param from the column's unit, or the one that a person chose where the heading names none
 * @param to unit wanted
 * @returns one value for each of the column's, NaN where there was none
 * @throws {UnitMismatch} when the two units measure different things
 * @example valuesIn(column, 'psig', 'Pag')
 */
export const valuesIn = (column: LoggerColumn, from: UnitId, to: UnitId): Float64Array =>
  column.values.map((value) => convert(value, from, to));
