import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { convert, toSi } from '../units/convert';
import { kelvin, kelvinDifference, pascalAbsolute, pascalGauge, second } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from './gauge-pressure';
import {
  judgePressureTest,
  type JudgedPressureTest,
  type PressureTestReadings,
  type PressureTestVerdict,
} from './pressure-test-verdict';
import { fahrenheit, fahrenheitDifference, psig } from './readings.fixture';

type Answer = Extract<JudgedPressureTest, { ok: true }>;

const HOURS_24 = second(toSi(24, 'h'));
const psi = (value: number): number => toSi(value, 'psig');
const inPsi = (valuePa: number): number => convert(valuePa, 'Pag', 'psig');

const READINGS: PressureTestReadings = {
  startPressure: psig(150),
  startTemperature: fahrenheit(80),
  endPressure: psig(146.95),
  endTemperature: fahrenheit(70),
  atmosphere: SEA_LEVEL_ATMOSPHERE,
  gaugeAccuracyPa: psi(0.25),
  temperatureAccuracy: fahrenheitDifference(1),
  held: HOURS_24,
  leastHold: HOURS_24,
};

function answer(change: Partial<PressureTestReadings> = {}): Answer {
  const result = judgePressureTest({ ...READINGS, ...change });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const exact = { gaugeAccuracyPa: 0, temperatureAccuracy: kelvinDifference(0) };

describe('judgePressureTest', () => {
  // The first is posed in "Pressure testing a system with dry nitrogen", ACHR News; figures worked from the gas law.
  it.each([
    [150, 80, 70, 146.95, -3.05],
    [150, 95, 75, 144.06, -5.94],
    [300, 80, 70, 294.17, -5.83],
  ])('%d psig from %d to %d °F: expects %d, %d explained', (start, from, to, expected, explained) => {
    const result = answer({
      startPressure: psig(start),
      startTemperature: fahrenheit(from),
      endTemperature: fahrenheit(to),
      endPressure: psig(expected),
    });
    expect(inPsi(result.expected)).toBeCloseTo(expected, 2);
    expect(inPsi(result.explainedChangePa)).toBeCloseTo(explained, 2);
    expect(inPsi(result.unexplainedChangePa)).toBeCloseTo(0, 2);
    expect(result.verdict).toBe('tight');
  });

  // "CS-17 Gas laws and pressure testing", Cool Concerns, March 2016, p. 1 (atmosphere 1 bar, kelvin as °C + 273).
  it('finds 25.81 bar at 18 °C tight after 24.8 bar at 7 °C, and 24.8 bar a leak', () => {
    const warmed = {
      startPressure: pascalGauge(toSi(24.8, 'barg')),
      startTemperature: kelvin(280),
      endTemperature: kelvin(291),
      atmosphere: pascalAbsolute(toSi(1, 'bara')),
      gaugeAccuracyPa: toSi(0.1, 'barg'),
    };
    expect(answer({ ...warmed, endPressure: pascalGauge(toSi(25.81, 'barg')) }).verdict).toBe('tight');
    expect(answer({ ...warmed, endPressure: pascalGauge(toSi(24.8, 'barg')) }).verdict).toBe('leak');
  });

  // UFGS 15182 corrects by 0.3 psi for each °F at every pressure: right only near 144 psig.
  it('calls 297 psig after 10 °F of cooling from 300 psig fed, which the flat 0.3 psi/°F would pass', () => {
    const result = answer({ startPressure: psig(300), endPressure: psig(297) });
    expect(inPsi(result.unexplainedChangePa)).toBeCloseTo(2.83, 2);
    expect(result.verdict).toBe('rising');
  });

  // Worked by hand: 300 psig needs ±1.7 °F in one thermometer reading for ±1 psi (0.594 psi/°F).
  it('gives the thermometer 0.594 psi for each °F at 300 psig and 70 °F, once for each reading', () => {
    const { tolerancePa } = answer({
      startPressure: psig(300),
      startTemperature: fahrenheit(70),
      endPressure: psig(300),
      gaugeAccuracyPa: 0,
    });
    expect(inPsi(tolerancePa)).toBeCloseTo(0.594 * Math.SQRT2, 3);
  });

  it('gives two readings of the gauge its accuracy times root two at an unchanged temperature', () => {
    const { tolerancePa } = answer({
      startTemperature: fahrenheit(70),
      endPressure: psig(150),
      temperatureAccuracy: kelvinDifference(0),
    });
    expect(inPsi(tolerancePa)).toBeCloseTo(0.25 * Math.SQRT2, 9);
  });

  // Worked by hand: √(1² + 2²) bar, beside which the other terms vanish.
  it('counts the first reading of the gauge as often as the temperature multiplies it', () => {
    const { tolerancePa } = answer({
      startPressure: psig(0),
      startTemperature: kelvin(200),
      endTemperature: kelvin(400),
      gaugeAccuracyPa: 1e5,
      temperatureAccuracy: kelvinDifference(0),
    });
    expect(tolerancePa / 1e5).toBeCloseTo(Math.sqrt(5), 4);
  });

  // Real nitrogen: 293.9 psig (reference equation of state) where the ideal gas says 294.17.
  it('leaves room for what nitrogen does beyond an ideal gas', () => {
    const test = { ...exact, startPressure: psig(300) };
    expect(inPsi(answer({ ...test, endPressure: psig(294) }).tolerancePa)).toBeCloseTo(0.3, 1);
    expect(answer({ ...test, endPressure: psig(293.9) }).verdict).toBe('tight');
    expect(answer({ ...test, endPressure: psig(293.8) }).verdict).toBe('leak');
  });

  const verdicts: readonly (readonly [string, Partial<PressureTestReadings>, PressureTestVerdict])[] = [
    ['a loss that nothing explains', { endPressure: psig(145) }, 'leak'],
    ['a loss within what the template allows', { endPressure: psig(146), allowedLossPa: psi(1) }, 'tight'],
    ['a loss beyond it', { endPressure: psig(145.9), allowedLossPa: psi(1) }, 'leak'],
    ['no change where cooling must lower it: a cylinder left open', { endPressure: psig(150) }, 'rising'],
    ['a test cut to the lunch hour', { held: second(3600) }, 'tooShort'],
    ['a leak in a short test', { held: second(3600), endPressure: psig(140) }, 'leak'],
    ['a template without a hold', { held: second(0), leastHold: null }, 'tight'],
  ];
  it.each(verdicts)('%s', (_, change, verdict) => {
    expect(answer(change).verdict).toBe(verdict);
  });

  it('passes the exact pressure with perfect instruments, and nothing below', () => {
    const still = { ...exact, startTemperature: fahrenheit(70) };
    expect(answer({ ...still, endPressure: psig(150) }).verdict).toBe('tight');
    expect(answer({ ...still, endPressure: psig(149.99) }).verdict).toBe('leak');
    expect(answer({ ...still, endPressure: psig(150.01) }).verdict).toBe('rising');
  });

  it('shows its working, the judged figure last', () => {
    const { working, unexplainedChangePa } = answer();
    expect(working.formula).toBe('pressureTestCorrected');
    expect(working.lines.at(-1)).toEqual({
      label: 'unexplainedChange',
      value: unexplainedChangePa,
      unit: 'Pa_diff',
    });
    expect(working.lines).toContainEqual({ label: 'leastHold', value: HOURS_24, unit: 's' });
    expect(answer({ leastHold: null }).working.lines.map((line) => line.label)).not.toContain('leastHold');
  });

  const refusals: readonly (readonly [Partial<PressureTestReadings>, string])[] = [
    [{ endPressure: pascalGauge(NaN) }, 'notFinite'],
    [{ endTemperature: kelvin(NaN) }, 'notFinite'],
    [{ gaugeAccuracyPa: NaN }, 'notFinite'],
    [{ held: second(NaN) }, 'notFinite'],
    [{ leastHold: second(Infinity) }, 'notFinite'],
    [{ startTemperature: kelvin(0) }, 'belowAbsoluteZero'],
    [{ endPressure: psig(-15) }, 'deeperThanVacuum'],
    [{ startPressure: psig(-15) }, 'deeperThanVacuum'],
    [{ gaugeAccuracyPa: -1 }, 'negativeAccuracy'],
    [{ temperatureAccuracy: kelvinDifference(-1) }, 'negativeAccuracy'],
    [{ held: second(-1) }, 'negativeDuration'],
    [{ allowedLossPa: -1 }, 'negativeAllowance'],
  ];
  it.each(refusals)('refuses %j: %s', (change, reason) => {
    expect(judgePressureTest({ ...READINGS, ...change })).toEqual({ ok: false, reason });
  });

  it('never turns a leak into a pass by losing more', () => {
    const anyLoss = fc.double({ min: 0, max: 60, noNaN: true });
    fc.assert(
      fc.property(anyLoss, anyLoss, (loss, more) => {
        const less = answer({ endPressure: psig(146.95 - loss) });
        const greater = answer({ endPressure: psig(146.95 - loss - more) });
        expect(greater.unexplainedChangePa).toBeLessThanOrEqual(less.unexplainedChangePa);
        if (less.verdict === 'leak') expect(greater.verdict).toBe('leak');
      }),
    );
  });

  it('allows more with poorer instruments, never less', () => {
    const accuracy = fc.double({ min: 0, max: 5, noNaN: true });
    fc.assert(
      fc.property(accuracy, accuracy, (gaugePsi, thermometerDegF) => {
        const good = answer({
          gaugeAccuracyPa: psi(gaugePsi),
          temperatureAccuracy: fahrenheitDifference(thermometerDegF),
        });
        const poor = answer({
          gaugeAccuracyPa: psi(gaugePsi + 1),
          temperatureAccuracy: fahrenheitDifference(thermometerDegF),
        });
        expect(poor.tolerancePa).toBeGreaterThan(good.tolerancePa);
      }),
    );
  });
});
