import { describe, expect, it } from '@jest/globals';
import {
  addDifference,
  averageTemperature,
  kelvin,
  kelvinDifference,
  subtractTemperatures,
} from './quantity';

describe('subtractTemperatures', () => {
  it('gives the difference between two temperatures', () => {
    expect(subtractTemperatures(kelvin(280), kelvin(275))).toBe(5);
  });

  it('keeps the sign when the first is the colder one', () => {
    expect(subtractTemperatures(kelvin(275), kelvin(276.5))).toBe(-1.5);
  });
});

describe('addDifference', () => {
  it('undoes a subtraction', () => {
    expect(addDifference(kelvin(275), kelvinDifference(-5))).toBe(270);
  });
});

describe('averageTemperature', () => {
  it('gives the arithmetic mean', () => {
    expect(averageTemperature([kelvin(270), kelvin(280), kelvin(281)])).toBe(277);
  });

  it('gives nothing when there is nothing to average', () => {
    expect(averageTemperature([])).toBeUndefined();
  });

  it('does not change its input', () => {
    const temperatures = [kelvin(280), kelvin(270)];
    averageTemperature(temperatures);
    expect(temperatures).toEqual([280, 270]);
  });
});
