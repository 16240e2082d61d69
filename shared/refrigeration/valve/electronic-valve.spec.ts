import { describe, expect, it } from '@jest/globals';
import { toSi } from '../../units/convert';
import { kelvin, kelvinDifference, pascalGauge } from '../../units/quantity';
import { fahrenheit, fahrenheitDifference, psig } from '../readings.fixture';
import {
  judgeElectronicValve,
  type ElectronicValveCheck,
  type ElectronicValveInputs,
} from './electronic-valve';

const GOOD: ElectronicValveInputs = {
  driverRefrigerant: 'R448A',
  circuitRefrigerant: 'R-448A',
  transducerReading: psig(45),
  gaugeReading: psig(44.5),
  gaugeAccuracyPa: toSi(1, 'psig'),
  iceBathReading: fahrenheit(32.5),
  sensorAccuracy: fahrenheitDifference(1),
  openPercent: 50,
};

const outcomeOf = (check: ElectronicValveCheck, change: Partial<ElectronicValveInputs>): string | undefined =>
  judgeElectronicValve({ ...GOOD, ...change }).find((found) => found.check === check)?.outcome;

describe('judgeElectronicValve', () => {
  it('finds nothing wrong with a driver that was set up well', () => {
    expect(judgeElectronicValve(GOOD).map(({ check, outcome }) => [check, outcome])).toEqual([
      ['refrigerant', 'within'],
      ['transducer', 'within'],
      ['sensor', 'within'],
      ['stroke', 'within'],
    ]);
  });

  it.each([
    ['R404A', 'R-448A', 'outside'],
    ['N40', 'R-448A', 'within'],
    ['CO2', 'R-744', 'within'],
    ['R-454C', 'r454c', 'within'],
    ['R-454C', 'R-455A', 'outside'],
    ['R-454C', 'R-448A', 'outside'],
    ['', 'R-448A', 'notJudged'],
    ['R-448A', ' ', 'notJudged'],
  ])('%s in the driver of a circuit with %s is %s', (driverRefrigerant, circuitRefrigerant, outcome) => {
    expect(outcomeOf('refrigerant', { driverRefrigerant, circuitRefrigerant })).toBe(outcome);
  });

  it.each([
    [psig(45.5), 'within'],
    [psig(43.5), 'within'],
    [psig(45.6), 'outside'],
    [psig(43.4), 'outside'],
    [pascalGauge(NaN), 'outside'],
    [null, 'notJudged'],
  ])('a transducer at %s Pa beside a gauge at 44.5 ± 1 psig is %s', (transducerReading, outcome) => {
    expect(outcomeOf('transducer', { transducerReading })).toBe(outcome);
  });

  it.each([
    [fahrenheit(33), 'within'],
    [fahrenheit(31), 'within'],
    [fahrenheit(33.1), 'outside'],
    [fahrenheit(30.9), 'outside'],
    [kelvin(NaN), 'outside'],
    [null, 'notJudged'],
  ])('a sensor that reads %s K in ice, good for ±1 °F, is %s', (iceBathReading, outcome) => {
    expect(outcomeOf('sensor', { iceBathReading })).toBe(outcome);
  });

  // 30 to 80 % (common practice, no source).
  it.each([
    [30, 'within'],
    [80, 'within'],
    [29, 'outside'],
    [81, 'outside'],
    [0, 'outside'],
    [100, 'outside'],
    [NaN, 'outside'],
    [null, 'notJudged'],
  ])('a valve at %s %% is %s the middle of its stroke', (openPercent, outcome) => {
    expect(outcomeOf('stroke', { openPercent })).toBe(outcome);
  });

  it('goes by another range where one is given, but never beyond the stroke', () => {
    const range = { minOpenPercent: 20, maxOpenPercent: 120 };
    expect(outcomeOf('stroke', { ...range, openPercent: 25 })).toBe('within');
    expect(outcomeOf('stroke', { ...range, openPercent: 110 })).toBe('outside');
    expect(outcomeOf('stroke', { minOpenPercent: 80, maxOpenPercent: 30 })).toBe('outside');
  });

  it('shows what it compared', () => {
    const [, transducer, sensor] = judgeElectronicValve(GOOD);
    expect(transducer?.working.lines.at(-1)?.value).toBeCloseTo(toSi(0.5, 'psig'), 6);
    expect(sensor?.working.lines.at(-1)?.value).toBeCloseTo(kelvinDifference(0.5 / 1.8), 9);
  });
});
