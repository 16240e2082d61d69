import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { UNITS } from '../units/unit';
import { judge } from './judge';
import { judgementSchema, type Judgement } from './judgement';
import { trendAnswerSchema, type TrendAnswer, type TrendStep } from './kinds/trend';
import { buildStep, SEA_LEVEL } from './step.fixture';
import { trendAnalysis } from './trend-judging';

const COLD = 275;
const WARM = 281;

/** A log of a temperature for each quarter of an hour. */
function logOf(temperatureK: readonly number[], change: Partial<TrendAnswer> = {}): TrendAnswer {
  return {
    kind: 'trend',
    file: { name: 'air.csv', sha256: 'b'.repeat(64), rows: temperatureK.length },
    startText: '2026-12-01 08:00',
    column: 'Air (°F)',
    atS: temperatureK.map((_, index) => index * 900),
    temperatureK: [...temperatureK],
    ...change,
  };
}

const times = (count: number, temperatureK: number): number[] =>
  Array.from({ length: count }, () => temperatureK);

// 41 °F (5 °C): the warmest that food which needs it may be kept (FDA Food Code 3-501.16(A)(2)).
const judged = (answer: TrendAnswer, change: Partial<TrendStep> = {}): Judgement =>
  judge(buildStep('trend', { bandHighK: 278.15, holdS: 86_400, ...change }), answer, SEA_LEVEL);

const kinds = ({ doubts }: Judgement) => doubts.map((doubt) => `${doubt.severity} ${doubt.kind}`);
const figure = ({ figures }: Judgement, label: string) =>
  figures.find((candidate) => candidate.label === label)?.value;

describe('judge of a trend', () => {
  it('is within when the band was reached and held for the time asked', () => {
    const judgement = judged(logOf([300, 290, ...times(97, COLD)]));
    expect(judgement).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(judgement.verdicts).toEqual(['trend_held']);
    // 290 to 275 K from 900 to 1800 s: 278.15 K after 79 % of it.
    expect(figure(judgement, 'reachedAt')).toBeCloseTo(900 + 900 * 0.79, 6);
    expect(figure(judgement, 'heldFor')).toBeCloseTo(86_400 + 900 * 0.21, 6);
    expect(figure(judgement, 'minimumTemperature')).toBe(COLD);
    expect(judgement.limit).toEqual({ low: 86_400, high: null, unit: 's', source: 'the specification' });
  });

  it.each([
    [97, 'trend_held'],
    [96, 'trend_notLongEnough'],
  ])('takes a day as a day: %d readings a quarter of an hour apart', (count, verdict) => {
    expect(judged(logOf(times(count, COLD))).verdicts).toEqual([verdict]);
  });

  it('keeps a hold that is still too short, without counting it', () => {
    const judgement = judged(logOf(times(20, COLD)));
    expect(judgement).toMatchObject({
      outcome: 'recorded',
      side: null,
      counts: false,
      verdicts: ['trend_notLongEnough'],
    });
    expect(kinds(judgement)).toEqual(['keep incomplete']);
    expect(figure(judgement, 'heldFor')).toBe(19 * 900);
  });

  it('is outside when it broke away, and when it never got there', () => {
    const away = judged(logOf([...times(97, COLD), ...times(8, WARM)]));
    expect(away).toMatchObject({ outcome: 'outside', side: 'high', counts: true, doubts: [] });
    expect(away.verdicts).toEqual(['trend_brokeAway']);
    expect(figure(away, 'longestAbove')).toBeGreaterThan(7 * 900);
    const never = judged(logOf(times(97, WARM)));
    expect(never).toMatchObject({ outcome: 'outside', side: 'high', counts: true, doubts: [] });
    expect(never.verdicts).toEqual(['trend_neverReached']);
    expect(never.figures.map(({ label }) => label)).toEqual(['heldFor']);
  });

  it('begins the hold again after an excursion, unless the template allows it', () => {
    const defrosted = logOf([...times(60, COLD), WARM, ...times(60, COLD)]);
    expect(judged(defrosted).verdicts).toEqual(['trend_notLongEnough']);
    expect(judged(defrosted, { longestExcursionS: 1800 }).verdicts).toEqual(['trend_held']);
  });

  it('knows a band with a lower edge', () => {
    const edge = { bandLowK: 273.15 };
    expect(judged(logOf(times(97, COLD)), edge).outcome).toBe('within');
    expect(judged(logOf([...times(97, COLD), ...times(8, 270)]), edge)).toMatchObject({
      outcome: 'outside',
      side: 'low',
      verdicts: ['trend_brokeAway'],
    });
    expect(judged(logOf(times(97, 270)), edge)).toMatchObject({
      side: 'low',
      verdicts: ['trend_neverReached'],
    });
    expect(judged(logOf(times(97, WARM)), edge)).toMatchObject({
      side: 'high',
      verdicts: ['trend_neverReached'],
    });
  });

  it.each([
    ['a temperature too few', logOf(times(97, COLD), { temperatureK: times(96, COLD) }), 'tooFewSamples'],
    ['a time too few', logOf(times(97, COLD), { atS: [0, 900] }), 'tooFewSamples'],
    ['no number among the temperatures', logOf([COLD, NaN, COLD]), 'notPlausible'],
    ['a figure that loggers write for a missing probe', logOf([COLD, -725.85, COLD]), 'notPlausible'],
    ['no number among the times', logOf([COLD, COLD], { atS: [0, NaN] }), 'notFinite'],
    ['one reading', logOf([COLD]), 'tooFewSamples'],
    ['no reading', logOf([]), 'tooFewSamples'],
    ['readings too far apart', logOf([COLD, COLD], { atS: [0, 7200] }), 'tooFewSamples'],
  ])('refuses %s', (_, answer, doubt) => {
    const judgement = judged(answer);
    expect(kinds(judgement)).toEqual([`refuse ${doubt}`]);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false, figures: [] });
  });

  it('refuses a band whose edges are swapped', () => {
    expect(kinds(judged(logOf(times(97, COLD)), { bandLowK: 280 }))).toEqual(['refuse notPlausible']);
  });

  it('rests on the analysis that draws the log', () => {
    const answer = logOf([300, ...times(97, COLD)]);
    const analysis = trendAnalysis(buildStep('trend', { bandHighK: 278.15, holdS: 86_400 }), answer);
    const judgement = judged(answer);
    expect(analysis.ok && analysis.heldFor).toBe(figure(judgement, 'heldFor'));
    expect(judgement.working).toEqual(analysis.ok ? [analysis.working] : null);
  });

  it('gives a judgement that can be stored, in SI, of whatever was logged', () => {
    const samples = fc.array(fc.tuple(fc.integer({ min: 0, max: 2e5 }), fc.double({ min: 250, max: 310 })), {
      maxLength: 40,
    });
    fc.assert(
      fc.property(samples, (points) => {
        const atS = points.map(([at]) => at);
        const temperatureK = points.map(([, temperature]) => temperature);
        const judgement = judged(logOf([], { atS, temperatureK }), { holdS: 600 });
        expect(judgementSchema.parse(JSON.parse(JSON.stringify(judgement)))).toEqual(judgement);
        const lines = [...judgement.figures, ...judgement.working.flatMap((working) => working.lines)];
        expect(lines.filter(({ unit }) => UNITS[unit].factor !== 1)).toEqual([]);
        if (judgement.outcome === 'within') {
          expect(figure(judgement, 'heldFor')).toBeGreaterThanOrEqual(600 - 1e-6);
          expect(judgement.counts).toBe(true);
        }
      }),
      { numRuns: 500 },
    );
  });

  it('takes its logs as answers', () => {
    expect(trendAnswerSchema.parse(logOf([COLD, COLD]))).toEqual(logOf([COLD, COLD]));
    expect(trendAnswerSchema.safeParse(logOf([NaN, COLD])).success).toBe(false);
  });
});
