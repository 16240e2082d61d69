import { describe, expect, it } from '@jest/globals';
import { convert, toSi } from '../units/convert';
import { kelvin, pascalAbsolute, pascalGauge } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from './gauge-pressure';
import { expectedTestPressure } from './pressure-test';
import { fahrenheit, psig } from './readings.fixture';

const expectedPsig = (startPsi: number, startDegF: number, endDegF: number): number => {
  const result = expectedTestPressure({
    startPressure: psig(startPsi),
    startTemperature: fahrenheit(startDegF),
    endTemperature: fahrenheit(endDegF),
    atmosphere: SEA_LEVEL_ATMOSPHERE,
  });
  return result.ok ? convert(result.expected, 'Pag', 'psig') : NaN;
};

describe('expectedTestPressure', () => {
  // The first is posed in "Pressure testing a system with dry nitrogen", ACHR News; figures worked from the gas law.
  it.each([
    [150, 80, 70, 146.95],
    [150, 95, 75, 144.06],
    [300, 80, 70, 294.17],
  ])('turns %d psig at %d °F into %d °F: %d psig', (startPsi, startDegF, endDegF, expected) => {
    expect(expectedPsig(startPsi, startDegF, endDegF)).toBeCloseTo(expected, 2);
  });

  // "CS-17 Gas laws and pressure testing", Cool Concerns, March 2016, p. 1 (atmosphere 1 bar, kelvin as °C + 273).
  it('turns 24.8 bar at 7 °C into 25.81 bar at 18 °C', () => {
    const result = expectedTestPressure({
      startPressure: pascalGauge(toSi(24.8, 'barg')),
      startTemperature: kelvin(280),
      endTemperature: kelvin(291),
      atmosphere: pascalAbsolute(toSi(1, 'bara')),
    });
    expect(result.ok && convert(result.expected, 'Pag', 'barg')).toBeCloseTo(25.81, 2);
  });

  it.each([
    [150, 0.311],
    [300, 0.594],
    [400, 0.783],
  ])('changes %d psig by %d psi for each °F at 70 °F', (startPsi, expected) => {
    expect(expectedPsig(startPsi, 70, 71) - startPsi).toBeCloseTo(expected, 3);
  });

  it('says why there is none', () => {
    const inputs = {
      startPressure: psig(150),
      startTemperature: kelvin(300),
      endTemperature: kelvin(290),
      atmosphere: SEA_LEVEL_ATMOSPHERE,
    };
    const reason = (change: Partial<typeof inputs>): unknown =>
      expectedTestPressure({ ...inputs, ...change });
    expect(reason({ startTemperature: kelvin(0) })).toEqual({ ok: false, reason: 'belowAbsoluteZero' });
    expect(reason({ endTemperature: kelvin(-1) })).toEqual({ ok: false, reason: 'belowAbsoluteZero' });
    expect(reason({ startPressure: psig(-15) })).toEqual({ ok: false, reason: 'deeperThanVacuum' });
    expect(reason({ endTemperature: kelvin(NaN) })).toEqual({ ok: false, reason: 'notFinite' });
  });
});
