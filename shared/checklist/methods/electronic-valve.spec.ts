import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, psi, withBoxes } from './measurement.fixture';

const valve = (change: Readonly<Record<string, string>> = {}, criteria: Record<string, number | null> = {}) =>
  judgeMeasured({ ...withBoxes(GOOD.electronicValve, change), criteria });

describe('an electronic valve', () => {
  it('can be trusted when driver, transducer, sensor and stroke are right', () => {
    const judgement = judgeMeasured(GOOD.electronicValve);
    expect(judgement).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(judgement.verdicts).toBeUndefined();
    expect(figure(judgement, 'transducerOff')).toBeCloseTo(psi(0.5), 6);
    expect(figure(judgement, 'opening')).toBeCloseTo(0.55, 12);
  });

  // Common practice, no source: 2 psi, 0.5 K in ice water, the middle of the stroke from 30 to 80 %.
  it.each([
    [{ driverRefrigerant: '=R-404A' }, ['refrigerant']],
    [{ driverRefrigerant: '=r 448a' }, []],
    [{ transducer: '47.1 psig' }, ['transducer']],
    [{ transducer: '42.9 psig' }, ['transducer']],
    [{ transducer: '46.9 psig' }, []],
    // 0.5 K is 0.9 °F.
    [{ iceBath: '33 degF' }, ['sensor']],
    [{ iceBath: '31 degF' }, ['sensor']],
    [{ iceBath: '32.8 degF' }, []],
    [{ opening: '29 percent' }, ['stroke']],
    [{ opening: '81 percent' }, ['stroke']],
    [{ opening: '30 percent' }, []],
    [{ driverRefrigerant: '=R-744', opening: '100 percent' }, ['refrigerant', 'stroke']],
  ])('with %j has wrong: %j', (change, checks) => {
    const judgement = valve(change);
    expect(judgement.outcome).toBe(checks.length === 0 ? 'within' : 'outside');
    expect(judgement.verdicts ?? []).toEqual(checks.map((check) => `electronicValve_${check}`));
    expect(judgement.counts).toBe(true);
  });

  it('follows the template’s own limits', () => {
    const close = { pressureRoom: psi(1), sensorRoom: 0.1, leastOpening: 0.5, greatestOpening: 0.6 };
    expect(valve({}, close).verdicts).toEqual(['electronicValve_sensor']);
    expect(valve({ transducer: '46.1 psig', iceBath: '32 degF' }, close).verdicts).toEqual([
      'electronicValve_transducer',
    ]);
    expect(valve({ iceBath: '32 degF', opening: '65 percent' }, close).verdicts).toEqual([
      'electronicValve_stroke',
    ]);
  });

  it.each(['—', '?', '...'])('is not within by a refrigerant that says nothing: %s', (name) => {
    const judgement = valve({ driverRefrigerant: `=${name}` });
    expect(doubtsOf(judgement)).toEqual(['refuse incomplete']);
    expect(judgement.outcome).toBe('recorded');
  });
});
