import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { kelvinDifference } from '../../units/quantity';
import { fahrenheitDifference } from '../readings.fixture';
import { minutes, turn } from './valve.fixture';
import { valveHint, type ValveHintInputs } from './valve-hint';
import { SETTLING_WAITS, type ClockwiseEffect, type ValveLog } from './valve-log';

const BAND = { low: fahrenheitDifference(6), high: fahrenheitDifference(8) };

function hint(
  superheatF: number,
  {
    clockwiseDoes = 'raisesSuperheat',
    log = [],
    uncertaintyF,
  }: {
    clockwiseDoes?: ClockwiseEffect | null;
    log?: ValveLog;
    uncertaintyF?: number;
  } = {},
  change: Partial<ValveHintInputs> = {},
) {
  const result = valveHint({
    band: BAND,
    superheat: fahrenheitDifference(superheatF),
    clockwiseDoes,
    log,
    now: minutes(60),
    wait: SETTLING_WAITS.shorter,
    ...(uncertaintyF === undefined ? {} : { uncertainty: fahrenheitDifference(uncertaintyF) }),
    ...change,
  });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

describe('valveHint', () => {
  it.each([
    [7, 'leave', null, null, null],
    [6, 'leave', null, null, null],
    [8, 'leave', null, null, null],
    [5.5, 'close', 'raise', 'clockwise', 'eighth'],
    [5, 'close', 'raise', 'clockwise', 'quarter'],
    [12, 'open', 'lower', 'counterclockwise', 'quarter'],
    [20, 'open', 'lower', 'counterclockwise', 'half'],
    [0, 'liquid', 'raise', 'clockwise', 'half'],
    [-0.5, 'liquid', 'raise', 'clockwise', 'half'],
  ])('at %d °F on 6 to 8 °F: %s, %s, %s, %s (common practice, no source)', (superheatF, ...expected) => {
    const { code, effect, direction, size, sizedBy } = hint(superheatF);
    expect([code, effect, direction, size]).toEqual(expected);
    expect(sizedBy).toBe(effect === null ? null : 'commonPractice');
  });

  // Makers differ: sheets say that clockwise raises the superheat, a trade article says that it opens.
  it('turns the other way where the sheet says so, and no way where nobody has read it', () => {
    expect(hint(12, { clockwiseDoes: 'lowersSuperheat' }).direction).toBe('clockwise');
    expect(hint(3, { clockwiseDoes: 'lowersSuperheat' }).direction).toBe('counterclockwise');
    const unread = hint(12, { clockwiseDoes: null });
    expect([unread.code, unread.effect, unread.direction]).toEqual(['open', 'lower', null]);
  });

  it('never learns the direction from what the valve did', () => {
    const log = [turn(0.5, 'clockwise', 0, 4, 8), turn(0.5, 'clockwise', 20, 8, 12)];
    expect(hint(12, { clockwiseDoes: null, log })).toMatchObject({
      code: 'open',
      direction: null,
      sizedBy: 'observed',
    });
  });

  it('waits after a turn, however far off the superheat is', () => {
    const waiting = hint(12, { log: [turn(0.25, 'counterclockwise', 50)] });
    expect([waiting.code, waiting.effect, waiting.remaining]).toEqual(['wait', null, minutes(5)]);
    expect(hint(7, { log: [turn(0.25, 'counterclockwise', 50)] }).code).toBe('wait');
    expect(hint(12, { log: [turn(0.25, 'counterclockwise', 45)] }).code).toBe('open');
  });

  it('doesn’t wait while liquid is leaving the coil', () => {
    expect(hint(-1, { log: [turn(0.25, 'counterclockwise', 59)] })).toMatchObject({
      code: 'liquid',
      effect: 'raise',
    });
  });

  it('asks to look again when the valve did the opposite of its sheet', () => {
    const log = [turn(0.5, 'clockwise', 20, 5, 3)];
    expect(hint(3, { log })).toMatchObject({ code: 'responseAgainstSheet', effect: null, direction: null });
    expect(hint(7, { log }).code).toBe('leave');
    // Liquid can't wait for the doubt to be cleared, but nobody says which way any more.
    expect(hint(0, { log })).toMatchObject({ code: 'liquid', effect: 'raise', direction: null });
  });

  it.each([
    [8.9, 1, 'withinError'],
    [9.1, 1, 'open'],
    [5.1, 1, 'withinError'],
    [8.9, undefined, 'open'],
    [0.5, 10, 'close'],
    [3.1, 3, 'withinError'],
    [2.9, 3.2, 'close'],
    [-0.1, 10, 'liquid'],
  ])('at %d °F with an uncertainty of %s °F: %s', (superheatF, uncertaintyF, code) => {
    expect(hint(superheatF, uncertaintyF === undefined ? {} : { uncertaintyF }).code).toBe(code);
  });

  describe('sizes by what two turns of this valve did', () => {
    const log = (perTurnF: number): ValveLog => [
      turn(0.5, 'clockwise', 0, 4, 4 + perTurnF / 2),
      turn(0.5, 'clockwise', 20, 4, 4 + perTurnF / 2),
    ];

    it.each([
      // 3 to 4 °F a turn is what one valve maker's sheet gives: 5 °F off the middle are more than half a turn.
      [12, 3.5, 'half', 'observed'],
      [12, 16, 'quarter', 'observed'],
      [9, 4, 'half', 'observed'],
      [9, 5, 'quarter', 'observed'],
      [9, 40, 'eighth', 'observed'],
      [12, 0.5, 'quarter', 'commonPractice'],
      [12, -3.5, 'quarter', 'commonPractice'],
    ])('at %d °F and %d °F a turn: %s, %s', (superheatF, perTurnF, size, sizedBy) => {
      // A last turn that followed the sheet leaves no doubt about its direction.
      const steady = turn(0.01, 'clockwise', 30, 4, 4);
      expect(hint(superheatF, { log: [...log(perTurnF), steady] })).toMatchObject({ size, sizedBy });
    });
  });

  it('shows its working', () => {
    const { working } = hint(12, { log: [turn(0.25, 'counterclockwise', 30)] });
    expect(working.formula).toBe('valveHint.open');
    expect(working.lines.map(({ label }) => label)).toEqual([
      'bandLow',
      'bandHigh',
      'uncertainty',
      'sinceLastTurn',
      'distanceToMiddle',
      'superheat',
    ]);
  });

  it.each([
    [{ superheat: kelvinDifference(NaN) }, 'notFinite'],
    [{ uncertainty: kelvinDifference(NaN) }, 'notFinite'],
    [{ uncertainty: kelvinDifference(-1) }, 'notFinite'],
    [{ now: minutes(NaN) }, 'notFinite'],
    [{ band: { low: BAND.high, high: BAND.low } }, 'bandSwapped'],
    [{ log: [turn(0, 'clockwise')] }, 'notATurn'],
    [{ log: [turn(1, 'clockwise', 9), turn(1, 'clockwise', 8)] }, 'outOfOrder'],
  ] as const)('case %#: gives no hint', (change, reason) => {
    const inputs: ValveHintInputs = {
      band: BAND,
      superheat: fahrenheitDifference(12),
      clockwiseDoes: null,
      log: [],
      now: minutes(60),
      wait: SETTLING_WAITS.shorter,
      ...change,
    };
    expect(valveHint(inputs)).toEqual({ ok: false, reason });
  });

  it('raises below the band, lowers above it, and turns only with a sheet', () => {
    const cases = fc.record({
      superheatF: fc.double({ min: -10, max: 40, noNaN: true }),
      clockwiseDoes: fc.constantFrom('raisesSuperheat' as const, 'lowersSuperheat' as const, null),
    });
    fc.assert(
      fc.property(cases, ({ superheatF, clockwiseDoes }) => {
        const { effect, direction, size } = hint(superheatF, { clockwiseDoes });
        fc.pre(Math.abs(superheatF - 6) > 1e-6 && Math.abs(superheatF - 8) > 1e-6);
        expect(effect).toBe(superheatF < 6 ? 'raise' : superheatF > 8 ? 'lower' : null);
        expect(size === null).toBe(effect === null);
        expect(direction === null).toBe(effect === null || clockwiseDoes === null);
      }),
    );
  });
});
