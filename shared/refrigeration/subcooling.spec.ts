import { describe, expect, it } from '@jest/globals';
import { kelvin, pascalGauge, subtractTemperatures } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from './gauge-pressure';
import { fahrenheit, inFahrenheit, inFahrenheitDifference, psig, refrigerant } from './readings.fixture';
import { dewTemperature } from './saturation/saturation-curve';
import { subcooling } from './subcooling';

const INPUTS = {
  table: refrigerant('R-404A'),
  liquidPressure: psig(225),
  atmosphere: SEA_LEVEL_ATMOSPHERE,
  lineTemperature: fahrenheit(86),
};

describe('subcooling', () => {
  // Computed with CoolProp.
  it('of R-404A at 225 psig and 86 °F is 10.5 °F below a bubble point of 96.5 °F', () => {
    const result = subcooling(INPUTS);
    if (!result.ok) throw new Error(result.reason);
    expect(Math.abs(inFahrenheitDifference(result.subcooling) - 10.5)).toBeLessThanOrEqual(0.3);
    expect(Math.abs(inFahrenheit(result.saturation) - 96.5)).toBeLessThanOrEqual(0.3);
    expect(result.working.formula).toBe('subcoolingFromBubble');
    expect(result.working.lines.at(-1)).toEqual({
      label: 'subcooling',
      value: result.subcooling,
      unit: 'K_diff',
    });
  });

  it('counts from bubble, so a blend’s glide never adds to it', () => {
    const table = refrigerant('R-448A');
    const result = subcooling({ ...INPUTS, table });
    const dew = dewTemperature(table, toAbsolute(INPUTS.liquidPressure, SEA_LEVEL_ATMOSPHERE));
    if (!result.ok || !dew.ok) throw new Error('no answer');
    const fromDew = subtractTemperatures(dew.temperature, INPUTS.lineTemperature);
    expect(result.subcooling).toBeCloseTo(fromDew - result.glide, 9);
    expect(result.glide).toBeGreaterThan(3);
  });

  it('keeps the sign of flash gas', () => {
    const result = subcooling({ ...INPUTS, lineTemperature: fahrenheit(100) });
    expect(result.ok && result.subcooling).toBeLessThan(-1.5);
  });

  it('says why there is none', () => {
    expect(subcooling({ ...INPUTS, liquidPressure: psig(600) })).toEqual({
      ok: false,
      reason: 'aboveCritical',
    });
    expect(subcooling({ ...INPUTS, liquidPressure: psig(505) })).toEqual({ ok: false, reason: 'aboveTable' });
    expect(subcooling({ ...INPUTS, liquidPressure: pascalGauge(Infinity) })).toEqual({
      ok: false,
      reason: 'notFinite',
    });
    expect(subcooling({ ...INPUTS, lineTemperature: kelvin(-1) })).toEqual({
      ok: false,
      reason: 'belowAbsoluteZero',
    });
    expect(subcooling({ ...INPUTS, lineTemperature: kelvin(NaN) })).toEqual({
      ok: false,
      reason: 'notFinite',
    });
  });
});
