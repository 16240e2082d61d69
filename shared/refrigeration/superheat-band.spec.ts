import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { kelvinDifference, subtractTemperatures } from '../units/quantity';
import { fahrenheit, fahrenheitDifference, inFahrenheitDifference } from './readings.fixture';
import { judgeSuperheat } from './superheat-band';

const BAND = { low: fahrenheitDifference(6), high: fahrenheitDifference(8) };

describe('judgeSuperheat', () => {
  it.each([
    [7, 'within', null, 0],
    [6, 'within', null, 0],
    [8, 'within', null, 0],
    [5.9, 'outside', 'low', 0.1],
    [8.1, 'outside', 'high', 0.1],
    [12, 'outside', 'high', 4],
    [-0.5, 'outside', 'low', 6.5],
  ])('finds %d °F %s a band of 6 to 8 °F (side %s, by %d °F)', (mean, outcome, side, distance) => {
    const judgement = judgeSuperheat(fahrenheitDifference(mean), BAND);
    expect(judgement).toMatchObject({ outcome, side });
    expect(inFahrenheitDifference(judgement.distance)).toBeCloseTo(distance, 9);
  });

  it('counts an edge as within after conversions', () => {
    const mean = subtractTemperatures(fahrenheit(27.9), fahrenheit(19.9));
    expect(judgeSuperheat(mean, BAND).outcome).toBe('within');
    expect(judgeSuperheat(kelvinDifference(BAND.high + 5e-10), BAND).outcome).toBe('within');
    expect(judgeSuperheat(kelvinDifference(BAND.low - 5e-10), BAND).outcome).toBe('within');
  });

  it('counts what is a millionth of a kelvin beyond an edge as outside', () => {
    expect(judgeSuperheat(kelvinDifference(BAND.high + 1e-6), BAND).outcome).toBe('outside');
    expect(judgeSuperheat(kelvinDifference(BAND.low - 1e-6), BAND).outcome).toBe('outside');
  });

  it.each([-2, -0.5, 0])('never passes %d K, whatever the band says', (mean) => {
    const band = { low: kelvinDifference(-5), high: kelvinDifference(5) };
    const distance = kelvinDifference(Math.abs(mean));
    expect(judgeSuperheat(kelvinDifference(mean), band)).toEqual({
      outcome: 'outside',
      side: 'low',
      distance,
      liquidRisk: true,
    });
  });

  it.each([
    [7, 3, false],
    [7, 0.1, false],
    [7, 0, true],
    [7, -2, true],
    [0, 1, true],
  ])('with a mean of %d and a minimum of %d °F has a liquid risk: %s', (mean, minimum, liquidRisk) => {
    const judgement = judgeSuperheat(fahrenheitDifference(mean), BAND, fahrenheitDifference(minimum));
    expect(judgement.liquidRisk).toBe(liquidRisk);
  });

  it('passes nothing that is no number', () => {
    const nothing = kelvinDifference(NaN);
    expect(judgeSuperheat(nothing, BAND)).toMatchObject({ outcome: 'outside', side: null, liquidRisk: true });
    expect(judgeSuperheat(BAND.low, { low: nothing, high: nothing }).outcome).toBe('outside');
    expect(judgeSuperheat(BAND.low, BAND, nothing).liquidRisk).toBe(true);
  });

  it('passes nothing in a band with its edges swapped', () => {
    fc.assert(
      fc.property(fc.double({ min: -20, max: 40, noNaN: true }), (mean) => {
        const judgement = judgeSuperheat(kelvinDifference(mean), { low: BAND.high, high: BAND.low });
        expect(judgement.outcome).toBe('outside');
      }),
    );
  });

  it('passes exactly the dry values between the edges, and measures the rest', () => {
    const values = fc.double({ min: -20, max: 40, noNaN: true });
    fc.assert(
      fc.property(values, values, values, (mean, a, b) => {
        const band = { low: kelvinDifference(Math.min(a, b)), high: kelvinDifference(Math.max(a, b)) };
        const judgement = judgeSuperheat(kelvinDifference(mean), band);
        const passes = mean > 1e-9 && mean >= band.low - 1e-9 && mean <= band.high + 1e-9;
        expect(judgement.outcome === 'within').toBe(passes);
        expect(judgement.distance).toBeGreaterThanOrEqual(0);
        expect(judgement.side === null).toBe(passes);
      }),
    );
  });
});
