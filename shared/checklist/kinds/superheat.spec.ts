import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import type { SequenceFacts } from '../facts';
import { buildStep, fahrenheitDegrees, hunting, pair, SEA_LEVEL, steady } from '../step.fixture';
import type { SuperheatAnswer } from './superheat';

/** Against a band in °F of difference. */
function judgeFor(
  refrigerant: string,
  answer: SuperheatAnswer,
  [low, high]: readonly [number, number] = [6, 8],
  facts: Partial<SequenceFacts> = {},
) {
  const band = { lowK: fahrenheitDegrees(low), highK: fahrenheitDegrees(high) };
  return judge(buildStep('superheat', { band }), answer, { ...SEA_LEVEL, refrigerant, ...facts });
}

type Judged = ReturnType<typeof judgeFor>;

function figure(judgement: Judged, label: string): number {
  const found = judgement.figures.find((candidate) => candidate.label === label);
  if (!found) throw new Error(`no figure ${label}`);
  return found.value;
}

const inFahrenheitDegrees = (judgement: Judged, label = 'superheat') => (figure(judgement, label) * 9) / 5;
const kinds = (judgement: Judged) => judgement.doubts.map((doubt) => `${doubt.severity} ${doubt.kind}`);

// Pressure at 5,000 ft by the ISA 1976 (ICAO 7488) barometric formula.
const ATMOSPHERE_AT_5000_FT = 101_325 * (1 - 2.25577e-5 * 1524) ** 5.25588;

describe('judge of a superheat', () => {
  // Worked with a Helmholtz-energy property program, not with the table in this project; the tolerance is what the
  // mixture model of a blend is good for (1 °F), or a pure or well-measured fluid (0.3 °F).
  it.each([
    ['R-448A', '45', '28', 0, 7.1, 1],
    ['R-404A', '16.0', '-14', 0, 6.0, 0.3],
    ['R-404A', '55.3', '27', 5000, 8.9, 0.3],
    ['R-744', '200', '-10', 0, 10.1, 0.3],
    ['R-404A', '55.3', '19.5', 0, -0.5, 0.3],
  ])('finds for %s at %s psig and %s °F, %s ft up, %s °F', (refrigerant, psig, line, feet, expected, off) => {
    const facts = feet === 0 ? {} : { atmospherePaAbs: ATMOSPHERE_AT_5000_FT };
    const judgement = judgeFor(refrigerant, steady(pair(psig, line)), [1, 12], facts);
    expect(Math.abs(inFahrenheitDegrees(judgement) - expected)).toBeLessThanOrEqual(off);
  });

  it('takes the dew temperature, never the bubble or the mean one', () => {
    // By bubble it would be 18.2 °F, by the middle 12.7 °F.
    expect(inFahrenheitDegrees(judgeFor('R-448A', steady(pair('45', '28'))))).toBeLessThan(8.1);
  });

  it('finds about 1.9 °F more for the same gauge reading at 5,000 ft than at the sea', () => {
    const answer = steady(pair('55.3', '27'));
    const low = inFahrenheitDegrees(judgeFor('R-404A', answer));
    const high = inFahrenheitDegrees(
      judgeFor('R-404A', answer, [6, 8], { atmospherePaAbs: ATMOSPHERE_AT_5000_FT }),
    );
    expect(high - low).toBeCloseTo(1.9, 1);
  });

  it('does not depend on the units that were typed', () => {
    const inPsi = judgeFor('R-448A', steady(pair('45', '28')));
    const inBar = judgeFor(
      'R-448A',
      // 45 psi are 3.10264 bar, 28 °F are −2.22222 °C.
      steady(pair('3,102641', '\u22122.222222', { pressure: 'barg', temperature: 'degC' })),
    );
    expect(figure(inBar, 'superheat')).toBeCloseTo(figure(inPsi, 'superheat'), 4);
    expect(inBar.outcome).toBe(inPsi.outcome);
  });

  it('judges a steady valve within, low and high', () => {
    const at = (line: string) => judgeFor('R-404A', steady(pair('16.0', line)), [5, 7]);
    expect(at('-14')).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(at('-17')).toMatchObject({ outcome: 'outside', side: 'low', counts: true });
    expect(at('-10')).toMatchObject({ outcome: 'outside', side: 'high', counts: true });
  });

  it('says how it was worked out, and by which band', () => {
    const judgement = judgeFor('R-448A', steady(pair('45', '28')));
    expect(judgement.working).toHaveLength(1);
    expect(judgement.working[0]?.source).not.toBe('');
    expect(judgement.working[0]?.lines.map((line) => line.label)).toContain('dewTemperature');
    expect(judgement.limit).toMatchObject({ unit: 'K_diff', source: 'the specification' });
    expect(figure(judgement, 'glide')).toBeGreaterThan(4);
  });

  it.each([
    ['55.3', '19.5', [0, 10]],
    ['55.3', '19.5', [-5, 10]],
    ['55.3', '10', [-20, 20]],
  ] as const)(
    'never has a superheat at or below zero within: %s psig, %s °F, band %s',
    (psig, line, band) => {
      const judgement = judgeFor('R-404A', steady(pair(psig, line)), band);
      expect(inFahrenheitDegrees(judgement)).toBeLessThan(0);
      expect(judgement).toMatchObject({ outcome: 'outside', side: 'low' });
      expect(kinds(judgement)).toContain('ask liquidRisk');
    },
  );

  // The middle between the two extremes is common practice, no source.
  it('judges a hunting valve by the middle, and flags a minimum below saturation', () => {
    // R-404A at 16.0 psig: dew −20.0 °F, so −4 °F is 16 °F and −31 °F is −11 °F.
    const judgement = judgeFor('R-404A', hunting(pair('16', '-31'), pair('16', '-4')), [2, 3]);
    expect(inFahrenheitDegrees(judgement)).toBeCloseTo(2.5, 0);
    expect(inFahrenheitDegrees(judgement, 'superheatLow')).toBeCloseTo(-11, 0);
    expect(inFahrenheitDegrees(judgement, 'superheatHigh')).toBeCloseTo(16, 0);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true });
    expect(kinds(judgement)).toContain('ask liquidRisk');
    expect(judgement.working).toHaveLength(2);
  });

  it('flags nothing on a hunting valve that stays dry', () => {
    const judgement = judgeFor('R-404A', hunting(pair('16', '-17'), pair('16', '-11')), [5, 7]);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, doubts: [] });
  });

  it('does not count a low pair that lies above the high one', () => {
    const judgement = judgeFor('R-404A', hunting(pair('16', '-11'), pair('16', '-17')));
    expect(judgement.counts).toBe(false);
    expect(kinds(judgement)).toEqual(['refuse lowAboveHigh']);
    expect(judgement.outcome).toBe('recorded');
  });

  it('does not count a hunting valve with one pair that can’t be read', () => {
    const judgement = judgeFor('R-404A', hunting(pair('16', ''), pair('16', '-4')));
    expect(judgement.counts).toBe(false);
    expect(kinds(judgement)).toEqual(['refuse empty']);
  });

  it('keeps the as-found beside the as-left and judges only the as-left', () => {
    const judgement = judgeFor('R-404A', steady(pair('16', '-14'), pair('16', '-2')), [5, 7]);
    expect(judgement.outcome).toBe('within');
    expect(inFahrenheitDegrees(judgement, 'superheatAsFound')).toBeCloseTo(18, 0);
  });

  it.each([
    [pair('', '-2'), 'ask empty'],
    [pair('16', 'cold'), 'ask notANumber'],
    [pair('-20', '-2'), 'ask deeperThanVacuum'],
    [pair('16', '-2', { pressure: 'psia' }), 'ask wrongUnit'],
  ])('only asks about an as-found that can’t be read', (asFound, doubt) => {
    const judgement = judgeFor('R-404A', steady(pair('16', '-14'), asFound), [5, 7]);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true });
    expect(kinds(judgement)).toEqual([doubt]);
  });

  it('asks when the two numbers fit only if exchanged', () => {
    const judgement = judgeFor('R-404A', steady(pair('-14', '16')), [5, 7]);
    expect(kinds(judgement)).toContain('ask swapped');
  });

  it('asks when a temperature in °C was typed into a box of °F', () => {
    // 28 °F are −2.2 °C.
    expect(kinds(judgeFor('R-448A', steady(pair('45', '-2.2'))))).toContain('ask celsiusInFahrenheit');
  });

  it.each([
    [pair('45', '-460'), 'refuse belowAbsoluteZero'],
    [pair('-15', '28'), 'refuse deeperThanVacuum'],
    [pair('900', '28'), 'refuse aboveCritical'],
    [pair('1,234', '28'), 'refuse ambiguous'],
    [pair('45', '28', { temperature: 'degF_diff' }), 'refuse wrongUnit'],
    [pair('45', '28', { pressure: 'micron' }), 'refuse wrongUnit'],
  ])('does not count what can’t be', (typed, doubt) => {
    const judgement = judgeFor('R-448A', steady(typed));
    expect(judgement.counts).toBe(false);
    expect(kinds(judgement)).toContain(doubt);
    expect(judgement.outcome).toBe('recorded');
  });

  it.each(['', 'R-404', 'R-999X'])('knows no superheat of the refrigerant %j', (refrigerant) => {
    const judgement = judgeFor(refrigerant, steady(pair('45', '28')));
    expect(kinds(judgement)).toEqual(['refuse unknownRefrigerant']);
  });

  it('does not change the step, the answer or the facts', () => {
    const step = buildStep('superheat', { band: { lowK: 3, highK: 5 } });
    const answer = hunting(pair('16', '-31'), pair('16', '-4'));
    const before = structuredClone({ step, answer, facts: SEA_LEVEL });
    judge(step, answer, SEA_LEVEL);
    expect({ step, answer, facts: SEA_LEVEL }).toEqual(before);
  });

  it('never throws and never gives a figure that is no number, whatever is typed', () => {
    const typed = fc.oneof(fc.string({ maxLength: 40 }), fc.double({ min: -1e4, max: 1e4 }).map(String));
    const anyPair = fc
      .tuple(
        typed,
        typed,
        fc.constantFrom('psig', 'barg', 'kPag', 'Pag', 'psia', 'm' as const),
        fc.constantFrom('degF', 'degC', 'K', 'K_diff' as const),
      )
      .map(([p, t, pressure, temperature]) => pair(p, t, { pressure, temperature }));
    const answers = fc.oneof(
      fc.tuple(anyPair, fc.option(anyPair)).map(([left, found]) => steady(left, found)),
      fc.tuple(anyPair, anyPair).map(([low, high]) => hunting(low, high)),
    );
    fc.assert(
      fc.property(answers, fc.constantFrom('R-448A', 'R-404A', 'R-744', 'R-290'), (answer, refrigerant) => {
        const judgement = judgeFor(refrigerant, answer);
        expect(judgement.figures.every(({ value }) => Number.isFinite(value))).toBe(true);
        if (judgement.outcome === 'within') expect(figure(judgement, 'superheat')).toBeGreaterThan(0);
      }),
      { numRuns: 1500 },
    );
  });
});
