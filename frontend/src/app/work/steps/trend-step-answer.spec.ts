import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { MOST_SAMPLES, trendAnswerSchema, type TrendStep } from '#shared/checklist/kinds/trend';
import { trendAnalysis } from '#shared/checklist/trend-judging';
import { LONGEST_GAP } from '#shared/refrigeration/logger/pull-down';
import { toSi } from '#shared/units/convert';
import { TREND_STEP } from '../../ui/trend-chart/trend.fixture';
import type { PickedLog } from '../logger/log-choice';
import { trendAnswerOf, WHOLE } from './trend-step-answer';

const DAY_S = 86_400;

function logOf(times: readonly number[], valuesK: readonly number[], heading = 'Air (°F)'): PickedLog {
  return {
    file: { name: 'box.csv', sha256: 'a'.repeat(64), rows: times.length },
    startText: '2026-11-30 06:00',
    times: Float64Array.from(times),
    columns: [{ key: 'temperature', heading, values: Float64Array.from(valuesK) }],
  };
}
const everyS = (stepS: number, count: number, valueK: (index: number) => number): PickedLog =>
  logOf(
    Array.from({ length: count }, (_, index) => index * stepS),
    Array.from({ length: count }, (_, index) => valueK(index)),
  );

describe('trendAnswerOf', () => {
  it('rounds times to 0.1 s and temperatures to 0.01 K, and leaves rows without one out', () => {
    const { answer, fitting } = trendAnswerOf(logOf([0, 10.04, 20.06], [300.004, NaN, 299.996]), TREND_STEP);
    expect(answer).toEqual({
      kind: 'trend',
      file: { name: 'box.csv', sha256: 'a'.repeat(64), rows: 3 },
      startText: '2026-11-30 06:00',
      column: 'Air (°F)',
      atS: [0, 20.1],
      temperatureK: [300, 300],
    });
    expect(fitting).toEqual(WHOLE);
  });

  it('never rounds a temperature across an edge of the band', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -400, max: 800 }),
        fc.integer({ min: -3, max: 3 }),
        fc.boolean(),
        (tenthsF, offTenths, isHigh) => {
          const edgeK = toSi(tenthsF / 10, 'degF');
          const valueK = toSi((tenthsF + offTenths) / 10, 'degF');
          const step: TrendStep = isHigh
            ? { ...TREND_STEP, bandHighK: edgeK }
            : { ...TREND_STEP, bandLowK: edgeK, bandHighK: 400 };
          const [kept = NaN] = trendAnswerOf(logOf([0], [valueK]), step).answer.temperatureK;
          expect(Math.abs(kept - valueK)).toBeLessThan(0.0101);
          if (isHigh) expect(kept <= edgeK + 1e-9).toBe(offTenths <= 0);
          else expect(kept >= edgeK - 1e-9).toBe(offTenths >= 0);
        },
      ),
    );
  });

  it('keeps a log at the very edge within: 39 °F is 277.0389 K', () => {
    const edgeK = toSi(39, 'degF');
    const step = { ...TREND_STEP, bandHighK: edgeK };
    const { answer } = trendAnswerOf(
      everyS(600, 200, () => edgeK),
      step,
    );
    expect(answer.temperatureK[0]).toBe(277.03);
    expect(trendAnalysis(step, answer)).toMatchObject({ ok: true, outcome: 'held' });
  });

  it('keeps a log as long as an entry holds whole', () => {
    const { answer, fitting } = trendAnswerOf(
      everyS(10, MOST_SAMPLES, () => 280),
      TREND_STEP,
    );
    expect(fitting).toEqual(WHOLE);
    expect(answer.atS).toHaveLength(MOST_SAMPLES);
  });

  it('reduces a longer one without losing its peak, and it is judged the same', () => {
    const log = everyS(10, 20_000, (index) => (index === 12_345 ? 281 : 275 + 2 * Math.sin(index / 50)));
    const { answer, fitting } = trendAnswerOf(log, TREND_STEP);
    expect(fitting).toEqual({ isReduced: true, isCut: false });
    expect(answer.atS.length).toBeLessThanOrEqual(MOST_SAMPLES);
    expect(answer.temperatureK).toContain(281);
    expect(answer.file.rows).toBe(20_000);
    const whole = {
      ...answer,
      atS: [...log.times],
      temperatureK: [...(log.columns[0]?.values ?? [])],
    };
    const [reduced, full] = [trendAnalysis(TREND_STEP, answer), trendAnalysis(TREND_STEP, whole)];
    expect(reduced.ok && reduced.outcome).toBe(full.ok && full.outcome);
    expect(trendAnswerSchema.safeParse(answer).success).toBe(true);
  });

  it('keeps the last days of a log of weeks, so close that none of it counts as unseen', () => {
    const { answer, fitting } = trendAnswerOf(
      everyS(60, 60 * 24 * 30, () => 275),
      TREND_STEP,
    );
    expect(fitting).toEqual({ isReduced: true, isCut: true });
    const first = answer.atS[0] ?? NaN;
    const last = answer.atS.at(-1) ?? NaN;
    expect(last).toBe(60 * (60 * 24 * 30 - 1));
    expect(last - first).toBe(15 * DAY_S);
    const steps = answer.atS.slice(1).map((at, index) => at - (answer.atS[index] ?? NaN));
    expect(Math.max(...steps)).toBeLessThan(LONGEST_GAP);
    expect(trendAnalysis(TREND_STEP, answer)).toMatchObject({ outcome: 'held', timeUnknown: 0 });
  });

  it('cuts a log of rows far apart only as far as it must', () => {
    const { answer, fitting } = trendAnswerOf(
      everyS(600, 7000, () => 275),
      TREND_STEP,
    );
    expect(fitting).toEqual({ isReduced: false, isCut: true });
    expect(answer.atS).toHaveLength(MOST_SAMPLES);
    expect(answer.atS.at(-1)).toBe(6999 * 600);
  });

  it('shortens what an entry has no room for', () => {
    const log = { ...logOf([0, 1], [280, 280], 'x'.repeat(300)), startText: 'y'.repeat(100) };
    const { answer } = trendAnswerOf(log, TREND_STEP);
    expect(trendAnswerSchema.safeParse(answer).success).toBe(true);
  });
});
