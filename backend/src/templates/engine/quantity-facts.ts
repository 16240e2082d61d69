/**
 * Quantities as expressions see them, in SI. One class each: the expression language tells types apart by class, and so
 * refuses the sum of two temperatures before anything is worked out.
 */
abstract class Quantity {
  constructor(readonly si: number) {}
}
export class Temperature extends Quantity {}
export class TemperatureDifference extends Quantity {}
export class Duration extends Quantity {}
export class Length extends Quantity {}
export class HeatFlow extends Quantity {}

/** The quantity types of expressions, by the dimension that each of them measures. */
export const QUANTITIES = {
  temperature: Temperature,
  temperatureDifference: TemperatureDifference,
  duration: Duration,
  length: Length,
  heatFlow: HeatFlow,
} as const;
export type QuantityDimension = keyof typeof QUANTITIES;

/** Whether limits of a dimension may be worked out by an expression; others are written as numbers with a unit. */
export function isQuantityDimension(dimension: string): dimension is QuantityDimension {
  return Object.hasOwn(QUANTITIES, dimension);
}

/** The SI size of what an expression gave, or `null` when it isn't a finite quantity of that dimension. */
export function sizeOf(dimension: QuantityDimension, value: unknown): number | null {
  return value instanceof QUANTITIES[dimension] && Number.isFinite(value.si) ? value.si : null;
}
