import type { Volt } from '../units/quantity';

/**
 * How unequal three line voltages are: the largest deviation from their average, divided by the average. Not (highest −
 * lowest) ÷ average, which doubles the answer; nothing is rounded on the way.
 *
 * @param voltages the three line-to-line voltages, in volts, each above zero
 * @returns a fraction (0.01 is 1 %), or undefined when a voltage is zero, negative or no number
 * @source NEMA MG 1, definition of voltage unbalance, from memory and worked examples on public pages
 * @example voltageUnbalance([volt(460), volt(467), volt(450)]) // 0.0196
 */
export function voltageUnbalance(voltages: readonly [Volt, Volt, Volt]): number | undefined {
  if (!voltages.every((voltage) => Number.isFinite(voltage) && voltage > 0)) return undefined;
  const average = (voltages[0] + voltages[1] + voltages[2]) / 3;
  const deviations = voltages.map((voltage) => Math.abs(voltage - average));
  return Math.max(...deviations) / average;
}
