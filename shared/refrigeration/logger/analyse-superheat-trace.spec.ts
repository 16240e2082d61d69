import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { second, kelvinDifference, type KelvinDifference } from '../../units/quantity';
import { fahrenheitDifference, inFahrenheitDifference } from '../readings.fixture';
import type { SuperheatSample } from '../time-weighted-mean';
import {
  analyseSuperheatTrace,
  type SuperheatTraceAnalysis,
  type SuperheatTraceLimits,
} from './analyse-superheat-trace';

function analysis(
  samples: readonly SuperheatSample[],
  limits?: SuperheatTraceLimits,
): SuperheatTraceAnalysis {
  const result = analyseSuperheatTrace(samples, limits);
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const inDegF = (...points: (readonly [seconds: number, degF: number])[]): SuperheatSample[] =>
  points.map(([at, degF]) => ({ at: second(at), superheat: fahrenheitDifference(degF) }));

/** A trace in kelvin, one sample every `everyS`. */
const curve = (lastS: number, everyS: number, valueK: (atS: number) => number): SuperheatSample[] =>
  Array.from({ length: Math.floor(lastS / everyS) + 1 }, (_, index) => ({
    at: second(index * everyS),
    superheat: kelvinDifference(valueK(index * everyS)),
  }));

const sine = (periodS: number, meanK: number, peakToPeakK: number) => (atS: number) =>
  meanK + (peakToPeakK / 2) * Math.sin((2 * Math.PI * atS) / periodS);

/** A flutter that repeats itself nowhere, between −1 and 1; a fixed mix of digits, so that the spec never changes. */
const flutter = (atS: number): number =>
  ((Math.imul(Math.floor(atS) + 12345, 2654435761) >>> 8) % 2001) / 1000 - 1;

const degF = (value: KelvinDifference): number => inFahrenheitDifference(value);

describe('analyseSuperheatTrace', () => {
  // Worked by hand, straight lines between the samples: trapezia of 40+480+140+400 = 1060 °F·s over 140 s, and
  // 270+90+300+180 = 840 °F·s over 140 s.
  it.each([
    [inDegF([0, 2], [20, 2], [80, 14], [90, 14], [140, 2]), 7.57, 8.0, 2, 14],
    [inDegF([0, 3], [90, 3], [100, 15], [120, 15], [140, 3]), 6.0, 9.0, 3, 15],
  ])('weighs each value by how long it lasted (case %#)', (samples, mean, midpoint, minimum, maximum) => {
    const result = analysis(samples);
    expect(degF(result.mean)).toBeCloseTo(mean, 2);
    expect(degF(result.midpoint)).toBeCloseTo(midpoint, 9);
    expect(degF(result.minimum)).toBeCloseTo(minimum, 9);
    expect(degF(result.maximum)).toBeCloseTo(maximum, 9);
    expect(degF(result.amplitude)).toBeCloseTo(maximum - minimum, 9);
    expect(result).toMatchObject({ period: null, hunts: false, settled: 'tooShort', liquidRisk: false });
  });

  // The trade's example of a mean that hides liquid (common practice, no source).
  it('flags the minimum of a swing between 16 and −11 °F, whose middle is 2.5 °F', () => {
    const samples = Array.from(
      { length: 11 },
      (_, index) => [index * 60, index % 2 === 0 ? 16 : -11] as const,
    );
    const result = analysis(inDegF(...samples));
    expect(degF(result.midpoint)).toBeCloseTo(2.5, 9);
    expect(degF(result.mean)).toBeCloseTo(2.5, 9);
    expect(degF(result.minimum)).toBeCloseTo(-11, 9);
    expect(result).toMatchObject({ liquidRisk: true, hunts: true, settled: 'yes' });
    expect(result.period).toBeCloseTo(120, 6);
  });

  it.each([
    [0.1, false],
    [0, true],
    [-3, true],
  ])('says of a minimum of %d K whether liquid may leave: %s', (minimumK, expected) => {
    expect(analysis(curve(600, 10, (at) => (at === 300 ? minimumK : 5))).liquidRisk).toBe(expected);
  });

  it.each([
    [60, 1],
    [90, 7],
    [180, 13],
    [300, 30],
  ])('finds a period of %d s in samples every %d s', (period, every) => {
    const { period: found, hunts } = analysis(curve(5.3 * period, every, sine(period, 6, 8)));
    expect(Math.abs((found ?? NaN) - period)).toBeLessThanOrEqual(every / 2);
    expect(hunts).toBe(true);
  });

  it('finds it under flutter, one wild sample, and short spikes', () => {
    const rough = curve(900, 3, (at) => (at === 450 ? 40 : sine(120, 6, 8)(at) + 0.8 * flutter(at)));
    expect(Math.abs((analysis(rough).period ?? NaN) - 120)).toBeLessThanOrEqual(3);
    const spikes = curve(900, 3, (at) => (at % 150 < 20 ? 14 : 3));
    expect(analysis(spikes).period).toBeCloseTo(150, 6);
  });

  it.each([
    ['a steady valve', () => 5],
    ['flutter', (at: number) => 5 + 2 * flutter(at)],
    ['a slow fall', (at: number) => 20 - at / 60],
    ['one step', (at: number) => (at < 450 ? 4 : 9)],
  ])('finds no period in %s', (_, valueK) => {
    expect(analysis(curve(900, 5, valueK))).toMatchObject({ period: null, hunts: false });
  });

  it('calls a repeating swing hunting only above the limit', () => {
    expect(analysis(curve(900, 5, sine(100, 6, 1.9)))).toMatchObject({ hunts: false, settled: 'yes' });
    expect(analysis(curve(900, 5, sine(100, 6, 2.2)))).toMatchObject({ hunts: true, settled: 'yes' });
    expect(analysis(curve(900, 5, sine(100, 6, 2.2)), { huntsAboveK: 3 }).hunts).toBe(false);
  });

  it.each([
    ['steady for 300 s', curve(300, 10, () => 5), 'yes'],
    ['steady for 290 s', curve(290, 10, () => 5), 'tooShort'],
    ['drifting by 0.4 K between the halves', curve(600, 10, (at) => 5 + (0.8 * at) / 600), 'yes'],
    ['drifting by 0.6 K between the halves', curve(600, 10, (at) => 5 + (1.2 * at) / 600), 'no'],
    ['falling', curve(900, 5, (at) => 20 - at / 60), 'no'],
    ['fluttering regularly for 100 s', curve(100, 2, sine(20, 6, 1)), 'tooShort'],
    ['hunting for three periods', curve(540, 5, sine(180, 6, 8)), 'yes'],
    // Half a cycle more would shift the mean of each half; whole periods don't.
    ['hunting for three and a half', curve(630, 5, sine(180, 6, 8)), 'yes'],
    ['hunting for not quite three', curve(480, 5, sine(180, 6, 8)), 'tooShort'],
    ['hunting and drifting', curve(900, 5, (at) => sine(180, 6, 8)(at) + at / 450), 'no'],
    ['one slow cycle and a half', curve(1050, 5, sine(650, 6, 8)), 'tooShort'],
    ['one slow cycle, which may be a disturbance', curve(650, 5, sine(650, 6, 8)), 'no'],
    ['two slow cycles', curve(1200, 5, sine(650, 6, 8)), 'tooShort'],
    ['irregular', curve(900, 5, (at) => 5 + 3 * flutter(at)), 'no'],
  ])('of a valve %s', (_, samples, expected) => {
    expect(analysis(samples).settled).toBe(expected);
  });

  it('takes its limits as told', () => {
    const steady = curve(200, 10, () => 5);
    expect(analysis(steady, { steadyForS: 200 }).settled).toBe('yes');
    const drifting = curve(600, 10, (at) => 5 + (1.2 * at) / 600);
    expect(analysis(drifting, { driftBelowK: 0.7 }).settled).toBe('yes');
    expect(analysis(curve(630, 5, sine(180, 6, 8)), { wholePeriods: 5 }).settled).toBe('tooShort');
  });

  it('says why there is nothing to analyse', () => {
    expect(analyseSuperheatTrace([])).toEqual({ ok: false, reason: 'tooShort' });
    expect(analyseSuperheatTrace(inDegF([5, 2], [5, 3]))).toEqual({ ok: false, reason: 'tooShort' });
    expect(analyseSuperheatTrace(inDegF([0, 2], [5, NaN]))).toEqual({ ok: false, reason: 'notFinite' });
    expect(analyseSuperheatTrace(inDegF([0, 2], [NaN, 3]))).toEqual({ ok: false, reason: 'notFinite' });
  });

  it('shows its working, result last', () => {
    const result = analysis(curve(900, 5, sine(180, 6, 8)));
    expect(result.working.formula).toBe('superheatTraceMean');
    expect(result.working.lines).toContainEqual({ label: 'period', value: result.period, unit: 's' });
    expect(result.working.lines.at(-1)).toEqual({
      label: 'timeWeightedMean',
      value: result.mean,
      unit: 'K_diff',
    });
    expect(result.longestStep).toBe(5);
  });

  const traces = fc.uniqueArray(
    fc.record({ at: fc.integer({ min: 0, max: 5000 }), k: fc.double({ min: -10, max: 30, noNaN: true }) }),
    { minLength: 2, maxLength: 60, selector: ({ at }) => at },
  );
  const samplesOf = (points: readonly { at: number; k: number }[], shift = 0): SuperheatSample[] =>
    points.map(({ at, k }) => ({ at: second(at + shift), superheat: kelvinDifference(k) }));

  it('lies between its extremes and does not depend on the order', () => {
    fc.assert(
      fc.property(traces, (points) => {
        const result = analysis(samplesOf(points));
        expect(result.mean).toBeGreaterThanOrEqual(result.minimum - 1e-9);
        expect(result.mean).toBeLessThanOrEqual(result.maximum + 1e-9);
        expect(result.liquidRisk).toBe(points.some(({ k }) => k <= 1e-9));
        expect(analysis(samplesOf([...points].reverse()))).toEqual(result);
      }),
    );
  });

  it('does not depend on when the clock began', () => {
    fc.assert(
      fc.property(traces, fc.integer({ min: -100_000, max: 100_000 }), (points, shift) => {
        const here = analysis(samplesOf(points));
        const there = analysis(samplesOf(points, shift));
        expect(there.mean).toBeCloseTo(here.mean, 6);
        expect(there.drift).toBeCloseTo(here.drift, 6);
        expect(there).toMatchObject({ minimum: here.minimum, maximum: here.maximum, hunts: here.hunts });
        if (here.period === null) expect(there.period).toBeNull();
        else expect(there.period).toBeCloseTo(here.period, 6);
      }),
    );
  });
});
