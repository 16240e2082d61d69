import { describe, expect, it } from '@jest/globals';
import { kelvin, pascalGauge } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE } from './gauge-pressure';
import { plausibleLineTemperature, plausibleSuctionPressure } from './plausibility';
import { atmosphereAtFeet, fahrenheit, psig, refrigerant } from './readings.fixture';

describe('plausibleLineTemperature', () => {
  it.each([-60, -14, 28, 75, 110])('has nothing against %d °F', (degF) => {
    expect(plausibleLineTemperature(fahrenheit(degF))).toBeNull();
  });

  it.each([
    [fahrenheit(-460), 'belowAbsoluteZero', 'refuse'],
    [kelvin(0), 'belowAbsoluteZero', 'refuse'],
    [kelvin(NaN), 'notFinite', 'refuse'],
    [fahrenheit(200), 'notPlausible', 'ask'],
    [fahrenheit(-100), 'notPlausible', 'ask'],
  ])('doubts %d K: %s, %s', (temperature, kind, severity) => {
    expect(plausibleLineTemperature(temperature)).toEqual({ kind, severity, about: 'temperature' });
  });
});

describe('plausibleSuctionPressure', () => {
  it.each([
    ['R-448A', 45],
    ['R-404A', 16],
    ['R-404A', -5],
    ['R-134a', -1.8],
    ['R-744', 200],
    ['R-744', 450],
  ])('has nothing against %s at %d psig', (name, gaugePsi) => {
    expect(plausibleSuctionPressure(refrigerant(name), psig(gaugePsi), SEA_LEVEL_ATMOSPHERE)).toBeNull();
  });

  it.each([
    ['R-448A', psig(-15), 'deeperThanVacuum', 'refuse'],
    ['R-448A', pascalGauge(-101325), 'deeperThanVacuum', 'refuse'],
    ['R-448A', pascalGauge(NaN), 'notFinite', 'refuse'],
    ['R-448A', psig(700), 'aboveCritical', 'refuse'],
    ['R-744', psig(1100), 'aboveCritical', 'refuse'],
    ['R-448A', psig(400), 'notPlausible', 'ask'],
    ['R-448A', psig(-14), 'notPlausible', 'ask'],
    ['R-744', psig(45), 'notPlausible', 'ask'],
  ])('doubts %s at %d Pa: %s, %s', (name, pressure, kind, severity) => {
    const doubt = plausibleSuctionPressure(refrigerant(name), pressure, SEA_LEVEL_ATMOSPHERE);
    expect(doubt).toEqual({ kind, severity, about: 'pressure' });
  });

  it('measures a vacuum against the local atmosphere', () => {
    const doubt = plausibleSuctionPressure(refrigerant('R-404A'), psig(-13), atmosphereAtFeet(5280));
    expect(doubt?.kind).toBe('deeperThanVacuum');
  });
});
