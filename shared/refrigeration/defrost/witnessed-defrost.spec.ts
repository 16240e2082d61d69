import { describe, expect, it } from '@jest/globals';
import { kelvin, kelvinDifference, second } from '../../units/quantity';
import { fahrenheit, fahrenheitDifference } from '../readings.fixture';
import { at, MINUTE_S } from './defrost.fixture';
import {
  durationAcrossMidnight,
  judgeWitnessedDefrost,
  type WitnessedDefrost,
  type WitnessedDefrostResult,
} from './witnessed-defrost';

// Ends at 50 °F, fail-safe 55 min: usual for electric defrost of glass-door cases (common practice, no source).
const judge = (minutes: number, change: Partial<WitnessedDefrost> = {}): WitnessedDefrostResult =>
  judgeWitnessedDefrost({
    startedAt: second(0),
    endedAt: second(minutes * MINUTE_S),
    endTemperature: fahrenheit(50),
    terminationTemperature: fahrenheit(50),
    failSafe: second(55 * MINUTE_S),
    temperatureTolerance: fahrenheitDifference(1),
    ...change,
  });

const onTime = { terminationTemperature: null, endTemperature: null };

describe('judgeWitnessedDefrost', () => {
  it.each<[string, number, Partial<WitnessedDefrost>, string, string]>([
    ['reached its temperature', 28, {}, 'within', 'endedOnTemperature'],
    [
      'reached it within the tolerance',
      28,
      { endTemperature: fahrenheit(49) },
      'within',
      'endedOnTemperature',
    ],
    ['stopped just short', 28, { endTemperature: fahrenheit(48.9) }, 'outside', 'endedEarly'],
    ['went a second under the fail-safe', 55 - 1 / 60, {}, 'within', 'endedOnTemperature'],
    ['went to the fail-safe, warm as it was', 55, {}, 'outside', 'endedOnFailSafe'],
    ['went to the fail-safe, cold', 55, { endTemperature: fahrenheit(40) }, 'outside', 'endedOnFailSafe'],
    ['went to the fail-safe, unread', 55.5, { endTemperature: null }, 'outside', 'endedOnFailSafe'],
    ['went a minute past the fail-safe', 56, {}, 'outside', 'endedOnFailSafe'],
    ['went on after the fail-safe', 56.1, {}, 'outside', 'ranPastItsTime'],
    ['ended on time', 55, onTime, 'within', 'endedOnTime'],
    ['ended on time, read a minute late', 56, onTime, 'within', 'endedOnTime'],
    ['ended before its time', 40, onTime, 'within', 'endedOnTime'],
    ['went on after its time', 57, onTime, 'outside', 'ranPastItsTime'],
  ])('%s', (_, minutes, change, outcome, ending) => {
    expect(judge(minutes, change)).toMatchObject({ ok: true, outcome, ending });
  });

  it.each<[string, number, Partial<WitnessedDefrost>]>([
    ['noDuration', 0, {}],
    ['noDuration', -5, {}],
    ['noFailSafe', 28, { failSafe: null }],
    ['noFailSafe', 28, { failSafe: second(0) }],
    ['noEndTemperature', 28, { endTemperature: null }],
    ['negativeTolerance', 28, { temperatureTolerance: kelvinDifference(-1) }],
    ['notFinite', NaN, {}],
    ['notFinite', 28, { endTemperature: kelvin(NaN) }],
    ['notFinite', 28, { terminationTemperature: kelvin(Infinity) }],
    ['notFinite', 28, { failSafe: second(NaN) }],
  ])('says %s for %d min and %j', (reason, minutes, change) => {
    expect(judge(minutes, change)).toEqual({ ok: false, reason });
  });

  it('shows its working, the duration last', () => {
    const result = judge(28);
    const labels = result.ok ? result.working.lines.map(({ label }) => label) : [];
    expect(labels).toEqual([
      'endTemperature',
      'terminationTemperature',
      'temperatureTolerance',
      'failSafe',
      'defrostDuration',
    ]);
    expect(result).toMatchObject({ duration: 1680, working: { formula: 'defrostEndsOnTemperature' } });
    expect(judge(28, onTime)).toMatchObject({
      working: { formula: 'defrostEndsOnTime', lines: [{ label: 'failSafe' }, { value: 1680, unit: 's' }] },
    });
  });
});

describe('durationAcrossMidnight', () => {
  it.each([
    [at(23, 50), at(0, 10), 1200],
    [at(1), at(1, 28), 1680],
    [at(1), at(1), 0],
    [at(0, 1), 0, 86_340],
    [at(24), 0, undefined],
    [0, -1, undefined],
    [NaN, 0, undefined],
  ])('from %d to %d is %p', (startS, endS, expected) => {
    expect(durationAcrossMidnight(startS, endS)).toBe(expected);
  });
});
