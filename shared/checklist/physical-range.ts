import type { Dimension } from '../units/unit';
import type { DoubtKind } from './judgement';

/** Widest values that a site instrument can show, SI; wide on purpose: this catches slips, not bad work. */
const RANGES: Partial<Record<Dimension, { low: number; high: number; below: DoubtKind }>> = {
  temperature: { low: 150, high: 500, below: 'notPlausible' },
  temperatureDifference: { low: -150, high: 150, below: 'notPlausible' },
  gaugePressure: { low: -101_325, high: 20_000_000, below: 'deeperThanVacuum' },
  absolutePressure: { low: 0, high: 20_000_000, below: 'deeperThanVacuum' },
  vacuum: { low: 0, high: 110_000, below: 'deeperThanVacuum' },
  pressureDifference: { low: -20_000_000, high: 20_000_000, below: 'notPlausible' },
  length: { low: 0, high: 10_000, below: 'notNegatable' },
  area: { low: 0, high: 1_000_000, below: 'notNegatable' },
  heatFlow: { low: 0, high: 5_000_000, below: 'notNegatable' },
  mass: { low: 0, high: 50_000, below: 'notNegatable' },
  duration: { low: 0, high: 31_536_000, below: 'notNegatable' },
  electricCurrent: { low: 0, high: 5_000, below: 'notNegatable' },
  voltage: { low: 0, high: 40_000, below: 'notNegatable' },
  power: { low: 0, high: 5_000_000, below: 'notNegatable' },
  ratio: { low: 0, high: 10, below: 'notNegatable' },
  count: { low: 0, high: 100_000, below: 'notNegatable' },
};

/**
 * Whether a value lies outside what physics or any site instrument allows.
 *
 * @param si the value in the dimension's SI unit
 * @returns why it can't be, or `null`
 */
export function physicalDoubt(dimension: Dimension, si: number): DoubtKind | null {
  if (!Number.isFinite(si)) return 'notFinite';
  if (dimension === 'temperature' && si < 0) return 'belowAbsoluteZero';
  const range = RANGES[dimension];
  if (!range) return null;
  if (si < range.low) return range.below;
  return si > range.high ? 'notPlausible' : null;
}
