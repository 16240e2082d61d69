import { pascalAbsolute, type Kelvin, type PascalAbsolute, type PascalGauge } from '../units/quantity';
import { toAbsolute, toGauge } from './gauge-pressure';

export interface PressureTestInputs {
  /** Gauge pressure when the test began. */
  readonly startPressure: PascalGauge;
  readonly startTemperature: Kelvin;
  /** Temperature of the pipe now: not of the air where the pipe lies in the sun. */
  readonly endTemperature: Kelvin;
  readonly atmosphere: PascalAbsolute;
}

export type PressureTestResult =
  | { readonly ok: true; readonly expected: PascalGauge }
  | { readonly ok: false; readonly reason: 'notFinite' | 'belowAbsoluteZero' | 'deeperThanVacuum' };

/**
 * The gauge pressure that a tight section filled with dry nitrogen shows after its temperature has changed: absolute
 * pressure follows absolute temperature at constant volume.
 *
 * @param inputs pressures in pascals (start as gauge, atmosphere absolute), temperatures in kelvin
 * @returns expected gauge pressure in pascals, or the reason why there is none
 * @range any pressure above vacuum; nitrogen as an ideal gas, 0.3 psi too high at 300 psig over 10 °F
 * @source Gay-Lussac's law
 * @example expectedTestPressure({ 150 psig at 80 °F, now 70 °F, sea level }) // 146.95 psig
 */
export function expectedTestPressure(inputs: PressureTestInputs): PressureTestResult {
  const { startPressure, startTemperature, endTemperature, atmosphere } = inputs;
  const absolute = toAbsolute(startPressure, atmosphere);
  const expected = pascalAbsolute((absolute * endTemperature) / startTemperature);
  if (startTemperature <= 0 || endTemperature <= 0) return { ok: false, reason: 'belowAbsoluteZero' };
  if (absolute <= 0) return { ok: false, reason: 'deeperThanVacuum' };
  if (!Number.isFinite(expected)) return { ok: false, reason: 'notFinite' };
  return { ok: true, expected: toGauge(expected, atmosphere) };
}
