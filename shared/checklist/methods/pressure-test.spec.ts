import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, psi, withBoxes, type Measured } from './measurement.fixture';

const inPsi = (pascal: number): number => pascal / psi(1);

/** With a gauge good to ±0.5 psi and a thermometer good to ±1 °F; a day under pressure. */
function stood(start: string, end: string, change: Partial<Measured> = {}) {
  const [startPressure = '', startTemperature = ''] = start.split(', ');
  const [endPressure = '', endTemperature = ''] = end.split(', ');
  const boxes = { startPressure, startTemperature, endPressure, endTemperature };
  return judgeMeasured({
    ...withBoxes(GOOD.pressureTest, boxes),
    criteria: { leastHold: 86_400, leastPressure: null, allowedLoss: null },
    ...change,
  });
}

describe('a standing pressure test', () => {
  // Gay-Lussac's law on absolute pressure; the third case is a worked example of a public page (atmosphere 1 bar).
  it.each([
    ['150 psig, 80 degF', '146.9 psig, 70 degF', 146.95],
    ['150 psig, 95 degF', '144.0 psig, 75 degF', 144.06],
    ['300 psig, 80 degF', '294.1 psig, 70 degF', 294.17],
  ])('expects of %s at the end (%s) %d psig', (start, end, expected) => {
    const judgement = stood(start, end);
    expect(inPsi(figure(judgement, 'expectedPressure'))).toBeCloseTo(expected, 2);
    expect(judgement).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(judgement.verdicts).toEqual(['pressureTest_tight']);
  });

  it('works in bar and °C against another atmosphere', () => {
    const judgement = stood('24.8 barg, 7 degC', '25.8 barg, 18 degC', { facts: { atmospherePaAbs: 1e5 } });
    expect(figure(judgement, 'expectedPressure') / 1e5).toBeCloseTo(25.81, 2);
    expect(judgement.outcome).toBe('within');
  });

  // 150 psig, 80 to 70 °F: 146.95 psig; the instruments need 0.83 psi (root of the sum of squares, worked by hand).
  it.each([
    ['146.2', 'within', null, 'pressureTest_tight'],
    ['146.0', 'outside', 'low', 'pressureTest_leak'],
    ['147.7', 'within', null, 'pressureTest_tight'],
    ['147.9', 'outside', 'high', 'pressureTest_rising'],
  ])('judges %s psig where 146.95 is expected: %s', (end, outcome, side, verdict) => {
    const judgement = stood('150 psig, 80 degF', `${end} psig, 70 degF`);
    expect(judgement).toMatchObject({ outcome, side, counts: true, verdicts: [verdict] });
    expect(inPsi(figure(judgement, 'unexplainedChange'))).toBeCloseTo(Number(end) - 146.95, 2);
  });

  it('lets an allowed loss stand where it is the larger room', () => {
    const criteria = { leastHold: 86_400, leastPressure: null, allowedLoss: psi(1) };
    expect(stood('150 psig, 80 degF', '146.0 psig, 70 degF', { criteria }).outcome).toBe('within');
    expect(stood('150 psig, 80 degF', '145.9 psig, 70 degF', { criteria }).outcome).toBe('outside');
    expect(stood('150 psig, 80 degF', '146.0 psig, 70 degF', { criteria }).limit?.low).toBeCloseTo(
      -psi(1),
      6,
    );
  });

  it('tells of a time that was too short, and of a leak before that', () => {
    const short = judgeMeasured(withBoxes(GOOD.pressureTest, { held: '23.9 h' }));
    expect(short).toMatchObject({ outcome: 'outside', side: null, verdicts: ['pressureTest_tooShort'] });
    const leak = judgeMeasured(withBoxes(GOOD.pressureTest, { held: '1 h', endPressure: '250 psig' }));
    expect(leak).toMatchObject({ outcome: 'outside', side: 'low', verdicts: ['pressureTest_leak'] });
  });

  it('has no tight section that stood below the least test pressure', () => {
    const low = withBoxes(GOOD.pressureTest, { startPressure: '299 psig', endPressure: '293.2 psig' });
    expect(judgeMeasured(low)).toMatchObject({
      outcome: 'outside',
      verdicts: ['pressureTest_tight', 'pressureTest_pressureTooLow'],
    });
    expect(judgeMeasured(GOOD.pressureTest).outcome).toBe('within');
  });

  it('takes common instruments where nobody says how good they are', () => {
    const bare = withBoxes(GOOD.pressureTest, { gaugeAccuracy: null, temperatureAccuracy: null });
    const lines = judgeMeasured(bare).working[0]?.lines ?? [];
    // ±1 psi and ±1 K (common practice, no source).
    expect(lines.find(({ label }) => label === 'gaugeAccuracy')?.value).toBeCloseTo(psi(1), -1);
    expect(lines.find(({ label }) => label === 'temperatureAccuracy')?.value).toBe(1);
  });

  it.each([{ gaugeAccuracy: '-1 psi_diff' }, { temperatureAccuracy: '-1 degF_diff' }])(
    'refuses %j',
    (boxes) => {
      expect(doubtsOf(judgeMeasured(withBoxes(GOOD.pressureTest, boxes)))).toEqual(['refuse notPlausible']);
    },
  );

  it('refuses a pressure deeper than a vacuum', () => {
    const deep = withBoxes(GOOD.pressureTest, { endPressure: '-15 psig' });
    expect(doubtsOf(judgeMeasured(deep))).toEqual(['refuse deeperThanVacuum']);
  });

  it('keeps what was read in the evening, without counting it', () => {
    const evening = withBoxes(GOOD.pressureTest, { endPressure: null, endTemperature: null, held: null });
    const judgement = judgeMeasured(evening);
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false, figures: [] });
    expect(doubtsOf(judgement)).toEqual(['keep incomplete']);
  });
});
