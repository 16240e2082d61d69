import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert } from '../units/convert';
import { kelvin, pascalAbsolute } from '../units/quantity';
import {
  betweenBubbleAndDew,
  evaporatingPressure,
  evaporatingTemperature,
  type EvaporatingBasis,
} from './evaporating-temperature';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute, toGauge } from './gauge-pressure';
import { fahrenheit, inFahrenheit, psig, refrigerant } from './readings.fixture';

const BASES: readonly EvaporatingBasis[] = ['dew', 'bubble', 'mean', 'fortySixty'];

const temperatureAt = (name: string, gaugePsi: number, basis: EvaporatingBasis): number => {
  const result = evaporatingTemperature(
    refrigerant(name),
    toAbsolute(psig(gaugePsi), SEA_LEVEL_ATMOSPHERE),
    basis,
  );
  return result.ok ? inFahrenheit(result.temperature) : NaN;
};

const psigAt = (name: string, degF: number, basis: EvaporatingBasis): number => {
  const result = evaporatingPressure(refrigerant(name), fahrenheit(degF), basis);
  return result.ok ? convert(toGauge(result.pressure, SEA_LEVEL_ATMOSPHERE), 'Pag', 'psig') : NaN;
};

describe('betweenBubbleAndDew', () => {
  // "Mid-point article", HVAC School: 40 and 50.8 °F have their middle at 45.4 °F (printed as 45.5), and 46.5 °F by the
  // rule of 40 and 60 per cent.
  it.each([
    ['bubble', 40],
    ['mean', 45.4],
    ['fortySixty', 46.48],
    ['dew', 50.8],
  ] as const)('%s of 40 and 50.8 °F is %d °F', (basis, expected) => {
    const found = betweenBubbleAndDew(fahrenheit(40), fahrenheit(50.8), basis);
    expect(inFahrenheit(found)).toBeCloseTo(expected, 9);
  });
});

describe('evaporatingTemperature', () => {
  it.each([
    ['bubble', 40],
    ['mean', 45.4],
    ['fortySixty', 46.5],
    ['dew', 50.8],
  ] as const)('of R-407C at 80 psig, %s: %d °F', (basis, expected) => {
    expect(Math.abs(temperatureAt('R-407C', 80, basis) - expected)).toBeLessThanOrEqual(0.2);
  });

  // Computed with CoolProp: dew 20.9 °F, middle 15.4 °F (half of a glide of 11.1 °F below).
  it('of R-448A differs between dew and mean by half the glide', () => {
    expect(temperatureAt('R-448A', 45, 'dew')).toBeCloseTo(20.9, 1);
    expect(
      Math.abs(temperatureAt('R-448A', 45, 'dew') - temperatureAt('R-448A', 45, 'mean') - 5.55),
    ).toBeLessThan(0.5);
  });

  it.each(BASES)('is the same for a pure refrigerant on %s', (basis) => {
    expect(temperatureAt('R-134a', 18.4, basis)).toBeCloseTo(temperatureAt('R-134a', 18.4, 'dew'), 9);
  });

  it('shows its working and passes a failure on', () => {
    const result = evaporatingTemperature(refrigerant('R-448A'), pascalAbsolute(4e5), 'mean');
    if (!result.ok) throw new Error(result.reason);
    expect(result.working.formula).toBe('evaporatingTemperature.mean');
    expect(result.working.lines.at(-1)?.value).toBe(result.temperature);
    expect(result.glide).toBeCloseTo(result.dew - result.bubble, 12);
    expect(evaporatingTemperature(refrigerant('R-448A'), pascalAbsolute(NaN), 'dew')).toEqual({
      ok: false,
      reason: 'notFinite',
    });
    expect(evaporatingTemperature(refrigerant('R-448A'), pascalAbsolute(1e3), 'dew')).toEqual({
      ok: false,
      reason: 'belowTable',
    });
  });
});

describe('evaporatingPressure', () => {
  // Computed with CoolProp, ±1 psi: R-448A at 20 °F has 57.9 psig of bubble and 43.9 psig of dew pressure.
  it.each([
    ['dew', 43.9],
    ['bubble', 57.9],
  ] as const)('of R-448A at 20 °F on %s is %d psig', (basis, expected) => {
    expect(Math.abs(psigAt('R-448A', 20, basis) - expected)).toBeLessThanOrEqual(1);
  });

  it('of R-448A at 20 °F on mean lies about halfway, 40/60 nearer to the dew', () => {
    const dew = psigAt('R-448A', 20, 'dew');
    const mean = psigAt('R-448A', 20, 'mean');
    const fortySixty = psigAt('R-448A', 20, 'fortySixty');
    expect(Math.abs(mean - 50.6)).toBeLessThan(1);
    expect(fortySixty).toBeGreaterThan(dew);
    expect(fortySixty).toBeLessThan(mean);
  });

  it.each([
    [kelvin(NaN), 'notFinite'],
    [kelvin(150), 'belowTable'],
    [kelvin(354), 'aboveTable'],
    [kelvin(356), 'aboveCritical'],
  ])('of R-448A at %d K has none: %s', (temperature, reason) => {
    for (const basis of BASES)
      expect(evaporatingPressure(refrigerant('R-448A'), temperature, basis)).toEqual({ ok: false, reason });
  });

  it('shows its working', () => {
    const result = evaporatingPressure(refrigerant('R-448A'), fahrenheit(20), 'mean');
    if (!result.ok) throw new Error(result.reason);
    expect(result.working.formula).toBe('evaporatingPressure.mean');
    expect(result.working.lines.at(-1)).toEqual({
      label: 'absolutePressure',
      value: result.pressure,
      unit: 'Pa',
    });
  });

  it('is the exact inverse of the temperature, whatever the basis', () => {
    const cases = fc.record({
      name: fc.constantFrom('R-448A', 'R-407C', 'R-404A', 'R-134a', 'R-744'),
      temperatureK: fc.double({ min: 235, max: 290, noNaN: true }),
      basis: fc.constantFrom(...BASES),
    });
    fc.assert(
      fc.property(cases, ({ name, temperatureK, basis }) => {
        const pressure = evaporatingPressure(refrigerant(name), kelvin(temperatureK), basis);
        if (!pressure.ok) throw new Error(pressure.reason);
        const back = evaporatingTemperature(refrigerant(name), pressure.pressure, basis);
        expect(back.ok && back.temperature).toBeCloseTo(temperatureK, 8);
      }),
    );
  });
});
