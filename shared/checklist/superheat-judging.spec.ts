import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { analyseSuperheatTrace } from '../refrigeration/logger/analyse-superheat-trace';
import { superheatTrace } from '../refrigeration/logger/superheat-trace';
import { fahrenheit, psig, refrigerant as tableOf } from '../refrigeration/readings.fixture';
import { pascalAbsolute, second } from '../units/quantity';
import { judge } from './judge';
import { judgementSchema, type Judgement } from './judgement';
import {
  SUPERHEAT_CONDITIONS,
  superheatAnswerSchema,
  type SuperheatAnswer,
  type SuperheatObservation,
} from './kinds/superheat';
import { buildStep, hunting, pair, steady } from './step.fixture';
import {
  FACTS,
  judgeFor,
  inDegrees,
  kinds,
  lineOf,
  pointsOf,
  seriesOf,
  FILE,
  logOf,
  left,
  STEADY,
  SWING_FROM_2_TO_14,
  SWING_FROM_3_TO_15,
} from './superheat.fixture';

describe('superheat of published readings', () => {
  it('of R-22 at 59 psig (33 °F) and 40 °F is 7 °F, as a contractor’s manual works it', () => {
    const judgement = judgeFor(steady(pair('59', '40')), [6, 8], { facts: { refrigerant: 'R-22' } });
    expect(Math.abs(inDegrees(judgement) - 7)).toBeLessThanOrEqual(0.5);
    expect(judgement.outcome).toBe('within');
  });

  it('of an outlet 7 °F above its own saturation is 7 °F, whatever the compressor’s saturation is', () => {
    // R-404A at 59.3 psig has its dew near 23 °F; a manual warns of taking 15 °F of the compressor's inlet.
    const judgement = judgeFor(steady(pair('59.3', '30')), [6, 8]);
    expect(Math.abs(inDegrees(judgement) - 7)).toBeLessThanOrEqual(0.5);
  });

  it('swinging from −11 to 16 °F is 2.5 °F in the middle, and is flagged', () => {
    const judgement = judgeFor(hunting(pair('16', '-31'), pair('16', '-4')), [2, 3]);
    expect(inDegrees(judgement)).toBeCloseTo(2.5, 1);
    expect(judgement.outcome).toBe('within');
    expect(kinds(judgement)).toContain('ask liquidRisk');
  });
});

describe('superheat of a series', () => {
  // Trapezium rule, worked by hand: 1060 and 840 °F·s over 140 s.
  it.each([
    [SWING_FROM_2_TO_14, 7.57, 8, 2, 14],
    [SWING_FROM_3_TO_15, 6, 9, 3, 15],
  ])('%s has a mean of %d and a middle of %d °F', (points, mean, middle, lowest, highest) => {
    for (const look of [seriesOf(points), logOf(points)]) {
      const judgement = judgeFor(left(look));
      expect(inDegrees(judgement, 'superheatTimeWeighted')).toBeCloseTo(mean, 1);
      expect(inDegrees(judgement, 'superheatMidpoint')).toBeCloseTo(middle, 1);
      expect(inDegrees(judgement, 'superheatLow')).toBeCloseTo(lowest, 1);
      expect(inDegrees(judgement, 'superheatHigh')).toBeCloseTo(highest, 1);
      expect(inDegrees(judgement, 'amplitude')).toBeCloseTo(highest - lowest, 1);
    }
  });

  it('is held against the band by the mean that the template names, by the middle where it names none', () => {
    const answer = left(seriesOf(SWING_FROM_3_TO_15));
    for (const step of [{}, { judgedBy: 'midpoint' as const }]) {
      expect(judgeFor(answer, [5, 7], { step })).toMatchObject({ outcome: 'outside', side: 'high' });
    }
    const weighted = judgeFor(answer, [5, 7], { step: { judgedBy: 'timeWeighted' } });
    expect(weighted).toMatchObject({ outcome: 'within', side: null });
    expect(inDegrees(weighted)).toBeCloseTo(6, 1);
    expect(judgeFor(STEADY, [5, 7], { step: { judgedBy: 'timeWeighted' } }).outcome).toBe('within');
  });

  it('typed and logged are one, and the same as superheatTrace and its analysis', () => {
    const typed = judgeFor(left(seriesOf(SWING_FROM_2_TO_14)));
    const logged = judgeFor(left(logOf(SWING_FROM_2_TO_14)));
    expect({ ...logged, figures: [], working: [] }).toEqual({ ...typed, figures: [], working: [] });
    const read = superheatTrace({
      table: tableOf('R-404A'),
      atmosphere: pascalAbsolute(101_325),
      samples: pointsOf(SWING_FROM_2_TO_14).map(([atS, degF]) => ({
        at: second(atS),
        suctionPressure: psig(16),
        lineTemperature: fahrenheit(degF),
      })),
    });
    const analysed = read.ok ? analyseSuperheatTrace(read.samples) : read;
    if (!analysed.ok) throw new Error(analysed.reason);
    for (const judgement of [typed, logged]) {
      expect(inDegrees(judgement, 'superheatTimeWeighted')).toBeCloseTo((analysed.mean * 9) / 5, 9);
      expect(inDegrees(judgement, 'superheatMidpoint')).toBeCloseTo((analysed.midpoint * 9) / 5, 9);
      expect(judgement.working.map(({ formula }) => formula)).toEqual([
        'superheatTrace',
        'superheatTraceMean',
      ]);
    }
  });

  it('that is short is judged, and says that it was watched too short', () => {
    const judgement = judgeFor(left(seriesOf('0:-14 30:-14 60:-14')));
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, verdicts: ['superheat_watchLonger'] });
  });

  it('that drifts has not settled: kept, and not counted', () => {
    const judgement = judgeFor(left(seriesOf('0:-18 200:-16 400:-14 600:-12 800:-10')));
    expect(judgement).toMatchObject({ outcome: 'within', counts: false });
    expect(kinds(judgement)).toEqual(['keep notSettled']);
    expect(judgement.verdicts).toEqual(['superheat_notSettled']);
  });

  it('that stands for long enough has settled, and says nothing', () => {
    const judgement = judgeFor(left(seriesOf('0:-14 100:-14.1 200:-14 300:-14.1 400:-14')));
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, doubts: [] });
    expect(judgement.verdicts).toBeUndefined();
  });

  it('that repeats its swing hunts', () => {
    const period = ['-18', '-6'];
    const points = Array.from({ length: 21 }, (_, index) => `${index * 60}:${period[index % 2]}`).join(' ');
    const judgement = judgeFor(left(seriesOf(points)), [7, 9]);
    expect(judgement.verdicts).toContain('superheat_hunts');
    const cycle = judgement.figures.find(({ label }) => label === 'period');
    expect(cycle).toMatchObject({ unit: 's' });
    expect(cycle?.value).toBeCloseTo(120, 0);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true });
  });

  it('flags a lowest superheat at or below zero whatever the mean is', () => {
    const judgement = judgeFor(left(seriesOf('0:-22 60:-10 120:-22')), [1, 12]);
    expect(kinds(judgement)).toContain('ask liquidRisk');
    expect(inDegrees(judgement, 'superheatLow')).toBeLessThan(0);
  });

  it.each([
    ['nothing', seriesOf('0:-14'), ['refuse tooFewSamples']],
    ['one moment twice', seriesOf('0:-14 0:-13'), ['refuse tooFewSamples']],
    ['a slip', { valve: 'series', readings: [{ atS: 0, ...pair('16', 'cold') }] }, ['refuse notANumber']],
    ['no readings', { valve: 'series', readings: [] }, ['refuse tooFewSamples']],
    [
      'a pressure too few',
      { ...logOf(SWING_FROM_2_TO_14), pressurePag: [110_316] },
      ['refuse tooFewSamples'],
    ],
    ['a time too few', { ...logOf(SWING_FROM_2_TO_14), atS: [0, 20] }, ['refuse tooFewSamples']],
    [
      'a temperature too many',
      { ...logOf('0:-14 9:-14'), temperatureK: [247, 247, 247] },
      ['refuse tooFewSamples'],
    ],
    ['no numbers', { ...logOf('0:-14 9:-14'), temperatureK: [NaN, NaN] }, ['refuse tooFewSamples']],
  ] as const)('of %s is none', (_, look, doubts) => {
    const judgement = judgeFor(left(look as SuperheatObservation));
    expect(kinds(judgement)).toEqual(doubts);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false, figures: [] });
  });

  it('says how many of a log’s readings were used', () => {
    const log = logOf('0:-14 100:-14 200:-14 300:-14');
    const judgement = judgeFor(
      left({ ...log, pressurePag: log.pressurePag.map((pa, i) => (i === 1 ? 9e6 : pa)) }),
    );
    expect(lineOf(judgement, 'samplesRead')?.value).toBe(4);
    expect(lineOf(judgement, 'samplesUsed')?.value).toBe(3);
  });
});

describe('answers of the first release', () => {
  // What its program made of these two, taken from it: no field of later releases, no words that it didn't have.
  const BASE = { lowK: 2, highK: 9 };
  const first = (answer: SuperheatAnswer) => judge(buildStep('superheat', { band: BASE }), answer, FACTS);
  const limit = { low: 2, high: 9, unit: 'K_diff', source: 'the specification' };

  function expectFigures(judgement: Judgement, expected: readonly (readonly [string, number, string])[]) {
    expect(judgement.figures.map(({ label, unit }) => [label, unit])).toEqual(
      expected.map(([label, , unit]) => [label, unit]),
    );
    judgement.figures.forEach(({ value }, index) =>
      expect(value).toBeCloseTo(expected[index]?.[1] ?? NaN, 9),
    );
  }

  it('come out as they did: a steady valve with its as-found', () => {
    const judgement = first(steady(pair('16', '-14'), pair('16', '-2')));
    const { figures: _figures, working, ...said } = judgement;
    expect(said).toEqual({ outcome: 'within', side: null, counts: true, doubts: [], limit });
    expectFigures(judgement, [
      ['superheat', 3.3393918838557966, 'K_diff'],
      ['saturation', 244.25505256058867, 'K'],
      ['glide', 0.6540249467969375, 'K_diff'],
      ['superheatAsFound', 10.006058550522454, 'K_diff'],
    ]);
    expect(working.map(({ formula, lines }) => [formula, ...lines.map(({ label }) => label)])).toEqual(
      [1, 2].map(() => [
        'superheatFromDew',
        'suctionPressure',
        'atmosphere',
        'absolutePressure',
        'bubbleTemperature',
        'dewTemperature',
        'glide',
        'lineTemperature',
        'superheat',
      ]),
    );
  });

  it('come out as they did: a hunting valve', () => {
    const judgement = first(hunting(pair('16', '-31'), pair('16', '-4')));
    const { figures: _figures, working, ...said } = judgement;
    expect(said).toEqual({
      outcome: 'outside',
      side: 'low',
      counts: true,
      doubts: [
        { kind: 'notPlausible', severity: 'ask' },
        { kind: 'liquidRisk', severity: 'ask' },
      ],
      limit,
    });
    expectFigures(judgement, [
      ['superheat', 1.3949474394113537, 'K_diff'],
      ['superheatLow', -6.1050525605886605, 'K_diff'],
      ['superheatHigh', 8.894947439411368, 'K_diff'],
      ['saturation', 244.25505256058867, 'K'],
      ['glide', 0.6540249467969375, 'K_diff'],
    ]);
    expect(working).toHaveLength(2);
  });

  it('still are answers', () => {
    for (const answer of [
      steady(pair('16', '-14'), pair('16', '-2')),
      hunting(pair('16', '-31'), pair('16', '-4')),
    ])
      expect(superheatAnswerSchema.parse(answer)).toEqual(answer);
  });
});

describe('judge of any superheat', () => {
  it('gives a judgement that can be stored, whatever stands in the optional boxes', () => {
    const text = fc.oneof(
      fc.double({ min: -50, max: 300 }).map((value) => value.toFixed(2)),
      fc.string(),
    );
    const typed = fc.record({
      text,
      unit: fc.constantFrom('psi_diff', 'kPa_diff', 'degF_diff', 'psig' as const),
    });
    const number = fc.double({ min: -1e5, max: 2e6 });
    const list = fc.array(number, { maxLength: 6 });
    const looks: fc.Arbitrary<SuperheatObservation> = fc.oneof(
      fc.record({
        valve: fc.constant('log' as const),
        file: fc.constant(FILE),
        atS: list,
        pressurePag: list,
        temperatureK: list,
      }),
      fc.array(fc.tuple(fc.integer({ min: 0, max: 2000 }), text, text), { maxLength: 6 }).map((readings) => ({
        valve: 'series' as const,
        readings: readings.map(([atS, p, t]) => ({ atS, ...pair(p, t) })),
      })),
      fc.tuple(text, text).map(([p, t]) => ({ valve: 'steady' as const, pair: pair(p, t) })),
    );
    const answers: fc.Arbitrary<SuperheatAnswer> = fc.record({
      kind: fc.constant('superheat' as const),
      asFound: fc.option(looks),
      asLeft: looks,
      takenAt: fc.constantFrom('coilOutlet' as const, 'elsewhere' as const),
      lineDrop: fc.option(typed),
      conditions: fc.subarray([...SUPERHEAT_CONDITIONS]),
      instruments: fc.record({
        gauge: fc.constantFrom('vented', 'sealed', 'absolute' as const),
        pressureAccuracy: fc.option(typed),
        temperatureAccuracy: fc.option(typed),
      }),
    });
    fc.assert(
      fc.property(
        answers,
        fc.constantFrom('midpoint' as const, 'timeWeighted' as const),
        (answer, judgedBy) => {
          const judgement = judgeFor(answer, [1, 20], { step: { judgedBy } });
          expect(judgementSchema.parse(JSON.parse(JSON.stringify(judgement)))).toEqual(judgement);
          if (judgement.outcome === 'within') expect(inDegrees(judgement)).toBeGreaterThan(0);
          if (judgement.doubts.some(({ severity }) => severity !== 'ask'))
            expect(judgement.counts).toBe(false);
        },
      ),
      { numRuns: 1500 },
    );
  });

  it('takes its logs and series as answers', () => {
    for (const look of [logOf(SWING_FROM_2_TO_14), seriesOf(SWING_FROM_2_TO_14)])
      expect(superheatAnswerSchema.parse(left(look))).toEqual(left(look));
  });
});
