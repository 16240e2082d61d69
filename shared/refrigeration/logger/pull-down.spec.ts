import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { fromSi } from '../../units/convert';
import { kelvin, second, type Kelvin } from '../../units/quantity';
import { fahrenheit, inFahrenheit } from '../readings.fixture';
import { analysePullDown, COLD_HOLDING_LIMIT, type PullDownAnalysis, type PullDownInputs } from './pull-down';
import type { TemperatureSample } from './stretches';

const HIGH = kelvin(278);

const log = (...points: (readonly [seconds: number, kelvins: number])[]): TemperatureSample[] =>
  points.map(([at, value]) => ({ at: second(at), temperature: kelvin(value) }));

function analysis(
  samples: readonly TemperatureSample[],
  change: Partial<PullDownInputs> = {},
): PullDownAnalysis {
  const result = analysePullDown({
    samples,
    bandLow: null,
    bandHigh: HIGH,
    holdFor: second(1000),
    ...change,
  });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

// From 288 K down through 278 K at 200 s, out between 700 s and 900 s with a peak of 280 K, then in until 2400 s.
const EXCURSION = log(
  [0, 288],
  [400, 268],
  [600, 277],
  [700, 278],
  [800, 280],
  [900, 278],
  [1000, 276],
  [1700, 274],
  [2400, 277],
);

describe('COLD_HOLDING_LIMIT', () => {
  // FDA Food Code 3-501.16(A)(2): 5 °C (41 °F) or less.
  it('is 5 °C and 41 °F', () => {
    expect(fromSi(COLD_HOLDING_LIMIT.temperature, 'degC')).toBeCloseTo(5, 9);
    expect(inFahrenheit(COLD_HOLDING_LIMIT.temperature)).toBeCloseTo(41, 9);
    expect(COLD_HOLDING_LIMIT.source).toContain('3-501.16');
  });
});

describe('analysePullDown', () => {
  it('finds when the band was reached, on the straight line between two samples', () => {
    const result = analysis(log([0, 288], [400, 268], [800, 268], [1300, 270]));
    expect(result.reachedAt).toBeCloseTo(200, 9);
    expect(result.heldFrom).toBeCloseTo(200, 9);
    expect(result.heldFor).toBeCloseTo(1100, 9);
    expect(result).toMatchObject({ outcome: 'held', longestAbove: null, timeAbove: 0, restarts: [] });
  });

  it('gives minimum, maximum and time-weighted mean from then on', () => {
    const { afterReaching } = analysis(log([0, 288], [400, 268], [800, 268], [1300, 270]));
    expect(afterReaching?.minimum).toBe(268);
    expect(afterReaching?.maximum).toBeCloseTo(278, 9);
    // By hand: (200·273 + 400·268 + 500·269) / 1100.
    expect(afterReaching?.mean).toBeCloseTo(269.3636, 4);
  });

  it('begins the hold anew after an excursion', () => {
    const result = analysis(EXCURSION);
    expect(result.reachedAt).toBeCloseTo(200, 9);
    expect(result.longestAbove?.from).toBeCloseTo(700, 9);
    expect(result.longestAbove?.lasted).toBeCloseTo(200, 9);
    expect(result.timeAbove).toBeCloseTo(200, 9);
    expect(result.heldFrom).toBeCloseTo(900, 9);
    expect(result.heldFor).toBeCloseTo(1500, 9);
    expect(result.restarts).toEqual([{ at: 700, lasted: 200, because: 'above' }]);
    expect(result.outcome).toBe('held');
    expect(analysis(EXCURSION, { holdFor: second(1501) }).outcome).toBe('notLongEnough');
    expect(analysis(EXCURSION, { holdFor: second(1500) }).outcome).toBe('held');
  });

  it('lets an excursion pass that is no longer than allowed', () => {
    const result = analysis(EXCURSION, { longestExcursion: second(200), holdFor: second(2200) });
    expect(result).toMatchObject({ outcome: 'held', restarts: [] });
    expect(result.heldFrom).toBeCloseTo(200, 9);
    expect(result.timeAbove).toBeCloseTo(200, 9);
    expect(analysis(EXCURSION, { longestExcursion: second(199) }).heldFrom).toBeCloseTo(900, 9);
  });

  it('begins anew when it gets too cold, too', () => {
    const result = analysis(log([0, 276], [500, 276], [600, 274], [700, 276], [1500, 276]), {
      bandLow: kelvin(275),
    });
    expect(result).toMatchObject({
      outcome: 'notLongEnough',
      timeBelow: 100,
      timeAbove: 0,
      longestAbove: null,
    });
    expect(result.restarts).toEqual([{ at: 550, lasted: 100, because: 'below' }]);
    expect(result.heldFrom).toBe(650);
  });

  it('crosses a narrow band between two samples', () => {
    const result = analysis(log([0, 290], [200, 270], [400, 270]), { bandLow: kelvin(276) });
    expect(result.reachedAt).toBeCloseTo(120, 9);
    expect(result.restarts[0]?.at).toBeCloseTo(140, 9);
    expect(result.outcome).toBe('brokeAway');
  });

  it('counts a gap as unknown and begins anew after it', () => {
    const samples = log([0, 275], [800, 275], [1701, 275], [2500, 275]);
    const result = analysis(samples);
    expect(result).toMatchObject({
      outcome: 'notLongEnough',
      timeUnknown: 901,
      heldFrom: 1701,
      heldFor: 799,
    });
    expect(result.restarts).toEqual([{ at: 800, lasted: 901, because: 'gap' }]);
    expect(analysis(samples, { longestGap: second(901) })).toMatchObject({ outcome: 'held', heldFor: 2500 });
  });

  it('leaves gaps out of the mean', () => {
    const { afterReaching } = analysis(log([0, 270], [100, 270], [5000, 276], [5300, 276]));
    expect(afterReaching?.mean).toBeCloseTo((100 * 270 + 300 * 276) / 400, 9);
  });

  it.each([
    ['no sample', log(), 'tooShort'],
    ['one sample', log([0, 275]), 'tooShort'],
    ['one moment twice', log([0, 275], [0, 275]), 'tooShort'],
    ['samples too far apart', log([0, 275], [1000, 275], [2000, 275]), 'tooShort'],
    ['always too warm', log([0, 290], [500, 280], [1000, 279]), 'neverReached'],
    ['only touching the band', log([0, 290], [500, 278], [1000, 279]), 'neverReached'],
    ['warm at the end', log([0, 275], [800, 275], [1500, 279]), 'brokeAway'],
    ['silent at the end', log([0, 275], [800, 275], [3000, 279]), 'notLongEnough'],
    ['exactly on the edge', log([0, 278], [500, 278], [1000, 278]), 'held'],
    ['just short', log([0, 278], [500, 278], [999, 278]), 'notLongEnough'],
  ])('of a log with %s', (_, samples, expected) => {
    expect(analysis(samples).outcome).toBe(expected);
  });

  it('counts no time beyond the last moment in the band', () => {
    const result = analysis(log([0, 276], [800, 276], [900, 280]), { longestExcursion: second(100) });
    expect(result.heldFor).toBeCloseTo(850, 9);
    expect(result.outcome).toBe('notLongEnough');
  });

  it.each<readonly [string, Partial<PullDownInputs>]>([
    ['notFinite', { samples: log([0, NaN], [10, 275]) }],
    ['notFinite', { samples: log([NaN, 275], [10, 275]) }],
    ['notFinite', { bandHigh: kelvin(NaN) }],
    ['notFinite', { bandLow: kelvin(NaN) }],
    ['notFinite', { holdFor: second(NaN) }],
    ['edgesSwapped', { bandLow: kelvin(280) }],
    ['negativeDuration', { holdFor: second(-1) }],
    ['negativeDuration', { longestExcursion: second(-1) }],
  ])('refuses: %s (case %#)', (reason, change) => {
    const inputs = { samples: EXCURSION, bandLow: null, bandHigh: HIGH, holdFor: second(1000) };
    expect(analysePullDown({ ...inputs, ...change })).toEqual({ ok: false, reason });
  });

  it('shows its working, result last', () => {
    const { working, heldFor } = analysis(EXCURSION);
    expect(working.formula).toBe('pullDown');
    expect(working.lines).toContainEqual({ label: 'bandHigh', value: HIGH, unit: 'K' });
    expect(working.lines).toContainEqual({ label: 'longestGap', value: 900, unit: 's' });
    expect(working.lines.at(-1)).toEqual({ label: 'heldFor', value: heldFor, unit: 's' });
  });

  const logs = fc.uniqueArray(
    fc.record({ at: fc.integer({ min: 0, max: 20_000 }), degF: fc.integer({ min: 20, max: 70 }) }),
    { minLength: 2, maxLength: 60, selector: ({ at }) => at },
  );
  const samplesOf = (
    points: readonly { at: number; degF: number }[],
    unit: (degF: number) => Kelvin = fahrenheit,
    shift = 0,
  ): TemperatureSample[] =>
    points.map(({ at, degF }) => ({ at: second(at + shift), temperature: unit(degF) }));

  it('depends neither on the order nor on when the clock began', () => {
    fc.assert(
      fc.property(logs, fc.integer({ min: 0, max: 1_000_000 }), (points, shift) => {
        const change = { bandLow: fahrenheit(30), bandHigh: fahrenheit(41), longestExcursion: second(300) };
        const here = analysis(samplesOf(points), change);
        expect(analysis(samplesOf([...points].reverse()), change)).toEqual(here);
        const there = analysis(samplesOf(points, fahrenheit, shift), change);
        expect(there.outcome).toBe(here.outcome);
        expect(there.heldFor).toBeCloseTo(here.heldFor, 5);
        expect((there.reachedAt ?? 0) - (here.reachedAt === null ? 0 : shift)).toBeCloseTo(
          here.reachedAt ?? 0,
          5,
        );
      }),
    );
  });

  it('keeps its mean between its extremes and its times within the log', () => {
    fc.assert(
      fc.property(logs, fc.integer({ min: 0, max: 5000 }), (points, allowed) => {
        const result = analysis(samplesOf(points), {
          bandHigh: fahrenheit(41),
          longestExcursion: second(allowed),
        });
        const at = points.map((point) => point.at);
        const length = Math.max(...at) - Math.min(...at);
        const { timeAbove, timeBelow, timeUnknown, heldFor, afterReaching, longestAbove } = result;
        expect(timeAbove + timeBelow + timeUnknown).toBeLessThanOrEqual(length + 1e-6);
        expect(heldFor).toBeLessThanOrEqual(length + 1e-6);
        expect(longestAbove?.lasted ?? 0).toBeLessThanOrEqual(timeAbove + 1e-6);
        if (result.outcome === 'held') expect(heldFor).toBeGreaterThanOrEqual(1000 - 1e-5);
        if (afterReaching === null) return;
        expect(afterReaching.mean).toBeGreaterThanOrEqual(afterReaching.minimum - 1e-9);
        expect(afterReaching.mean).toBeLessThanOrEqual(afterReaching.maximum + 1e-9);
      }),
    );
  });
});
