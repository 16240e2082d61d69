import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, micron, withBoxes, type Typed } from './measurement.fixture';

/** Rows written as minute:microns. */
const rowsOf = (points: string): Typed[] =>
  points.split(' ').map((point) => {
    const [minute = '', pressure = ''] = point.split(':');
    return { since: `${minute} min`, pressure: `${pressure} micron` };
  });

type Criteria = Readonly<Record<string, number | null>>;

/** UFGS 15182: isolated at 300 µm, no more than 500 µm one hour later. */
const FEDERAL: Criteria = {
  target: micron(300),
  hold: 3600,
  limit: micron(500),
  greatestRise: null,
  leakAbove: null,
};

const rose = (points: string, criteria: Criteria = FEDERAL, typed: Typed = {}) =>
  judgeMeasured({ method: 'evacuation', typed, rows: rowsOf(points), criteria });

describe('an evacuation’s rise test', () => {
  it.each([
    ['0:300 60:480', 'within', null, 'dryAndTight'],
    ['0:300 60:500', 'within', null, 'dryAndTight'],
    ['0:300 60:295', 'within', null, 'dryAndTight'],
    // An isolated system can't get deeper by itself.
    ['0:300 60:50', 'outside', 'low', 'falling'],
    ['0:300 60:620', 'outside', 'high', 'overLimit'],
    ['0:300 20:407 40:513 60:620', 'outside', 'high', 'leak'],
    ['0:300 20:560 40:610 60:620', 'outside', 'high', 'moisture'],
    ['0:301 60:400', 'outside', 'high', 'notDeepEnough'],
    ['0:300 45:400', 'outside', null, 'tooShort'],
  ])('judges %s µm by the federal piping specification: %s', (points, outcome, side, verdict) => {
    const judgement = rose(points);
    expect(judgement).toMatchObject({ outcome, side, counts: true, doubts: [] });
    expect(judgement.verdicts?.[0]).toBe(`evacuation_${verdict}`);
  });

  // CALGreen 5.508.2.6 (from memory): drift of no more than 100 µm in 24 hours.
  it.each([
    ['0:300 1440:410', 'outside'],
    ['0:300 1440:400', 'within'],
  ])('judges %s µm by a drift alone: %s', (points, outcome) => {
    const drift = { ...FEDERAL, hold: 86_400, limit: null, greatestRise: micron(100) };
    expect(rose(points, drift)).toMatchObject({ outcome, limit: null });
  });

  it('has a leak above the pressure that the template names, however steady', () => {
    const criteria = { ...FEDERAL, leakAbove: micron(2000) };
    expect(rose('0:300 20:2400 40:2410 60:2410', criteria).verdicts).toEqual(['evacuation_leak']);
  });

  // Water: 4,585 µm at 0 °C, 18,790 µm at 70 °F, 6,296 µm at 40 °F (IAPWS and Murphy–Koop forms).
  it.each([
    ['0:300 20:4400 40:4570 60:4580', '70 degF', 'waterFreezing'],
    ['0:300 20:18000 40:18700 60:18750', '70 degF', 'nearWaterSaturation'],
    ['0:300 20:18000 40:18700 60:18750', '40 degF', 'aboveWaterSaturation'],
  ])('says of %s µm at %s: %s', (points, ambientTemperature, note) => {
    expect(rose(points, FEDERAL, { ambientTemperature }).verdicts).toEqual([
      'evacuation_moisture',
      `evacuation_${note}`,
    ]);
  });

  it('gives its figures as a vacuum', () => {
    const judgement = rose('0:300 60:480');
    expect(figure(judgement, 'endVacuum')).toBeCloseTo(micron(480), 9);
    expect(figure(judgement, 'rise')).toBeCloseTo(micron(180), 9);
    expect(figure(judgement, 'held')).toBe(3600);
    expect(judgement.limit).toEqual({
      low: null,
      high: micron(500),
      unit: 'Pa_vac',
      source: 'the specification',
    });
  });

  it('takes its readings in any order', () => {
    const ordered = rose('0:300 20:560 40:610 60:620');
    expect(rose('60:620 0:300 40:610 20:560')).toEqual(ordered);
  });

  it('refuses two readings of one moment', () => {
    expect(doubtsOf(rose('0:300 0:310 60:400'))).toEqual(['refuse notPlausible']);
  });

  it('has no criterion where the template gives neither limit nor rise', () => {
    const judgement = rose('0:300 60:480', { ...FEDERAL, limit: null });
    expect(doubtsOf(judgement)).toEqual(['refuse noCriterion']);
    expect(judgement.outcome).toBe('recorded');
  });

  it.each([
    ['nothing yet', []],
    ['the reading at isolation', rowsOf('0:300')],
    ['a row that is half filled', [...rowsOf('0:300 60:480'), { since: '70 min' }]],
  ])('keeps a test that is under way, without counting it: %s', (_, rows) => {
    const judgement = judgeMeasured({ ...withBoxes(GOOD.evacuation, {}), rows });
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false });
    expect(doubtsOf(judgement)).toEqual(['keep incomplete']);
  });
});
