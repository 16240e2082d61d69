import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { kelvinDifference, second } from '../../units/quantity';
import { inFahrenheitDifference } from '../readings.fixture';
import { minutes, turn } from './valve.fixture';
import {
  isAgainstSheet,
  kelvinPerClockwiseTurn,
  netTurns,
  settling,
  SETTLING_WAITS,
  type ValveLog,
} from './valve-log';

describe('netTurns', () => {
  it('counts clockwise as positive and keeps the way that was gone', () => {
    const log = [
      turn(0.5, 'clockwise', 0),
      turn(0.25, 'counterclockwise', 20),
      turn(1, 'counterclockwise', 40),
    ];
    expect(netTurns(log)).toEqual({ ok: true, clockwise: -0.75, travelled: 1.75 });
    expect(netTurns([])).toEqual({ ok: true, clockwise: 0, travelled: 0 });
  });

  it.each([0, -0.5, NaN, Infinity])('names an entry of %d turns', (turns) => {
    const log = [turn(0.5, 'clockwise', 0), turn(turns, 'clockwise', 20)];
    expect(netTurns(log)).toEqual({ ok: false, reason: 'notATurn', index: 1 });
  });

  it('names an entry that is earlier than the one before, or at no time', () => {
    const log = [turn(0.5, 'clockwise', 30), turn(0.5, 'clockwise', 20)];
    expect(netTurns(log)).toEqual({ ok: false, reason: 'outOfOrder', index: 1 });
    expect(netTurns([turn(0.5, 'clockwise', NaN)])).toEqual({ ok: false, reason: 'notATurn', index: 0 });
  });

  it('comes back to where it began when every turn is undone', () => {
    const eighths = fc.array(
      fc.tuple(
        fc.integer({ min: 1, max: 8 }),
        fc.constantFrom('clockwise' as const, 'counterclockwise' as const),
      ),
    );
    fc.assert(
      fc.property(eighths, (taken) => {
        const there = taken.map(([eighth, direction]) => turn(eighth / 8, direction));
        const back = taken.map(([eighth, direction]) =>
          turn(eighth / 8, direction === 'clockwise' ? 'counterclockwise' : 'clockwise'),
        );
        const result = netTurns([...there, ...back]);
        expect(result.ok && result.clockwise + 0).toBe(0);
      }),
    );
  });
});

describe('settling', () => {
  const log: ValveLog = [turn(0.5, 'clockwise', 0), turn(0.25, 'clockwise', 20)];

  // A case maker's manual waits 15 min, a valve maker's sheet 30 min.
  it('waits 15 or 30 minutes from the last turn', () => {
    expect(SETTLING_WAITS).toEqual({ shorter: 900, longer: 1800 });
    expect(settling(log, minutes(30), SETTLING_WAITS.shorter)).toEqual({
      settled: false,
      remaining: minutes(5),
      sinceLastTurn: minutes(10),
    });
    expect(settling(log, minutes(35), SETTLING_WAITS.shorter).settled).toBe(true);
    expect(settling(log, minutes(35), SETTLING_WAITS.longer).remaining).toBe(minutes(15));
  });

  it('has nothing to wait for on a valve that nobody touched', () => {
    expect(settling([], minutes(0), SETTLING_WAITS.longer)).toEqual({
      settled: true,
      remaining: 0,
      sinceLastTurn: null,
    });
  });

  it('is not settled when a clock stands before the turn, or is none', () => {
    expect(settling(log, minutes(10), SETTLING_WAITS.shorter)).toMatchObject({
      settled: false,
      remaining: 900,
    });
    expect(settling(log, second(NaN), SETTLING_WAITS.shorter)).toMatchObject({
      settled: false,
      remaining: 900,
    });
  });
});

describe('kelvinPerClockwiseTurn', () => {
  const inDegF = (log: ValveLog): number | null => {
    const found = kelvinPerClockwiseTurn(log);
    return found === null ? null : inFahrenheitDifference(kelvinDifference(found));
  };

  it('takes two turns that were read before and after', () => {
    expect(inDegF([turn(0.5, 'clockwise', 0, 4, 6)])).toBeNull();
    expect(inDegF([turn(0.5, 'clockwise', 0, 4, 6), turn(0.5, 'clockwise', 20, 6, null)])).toBeNull();
    expect(inDegF([turn(0.5, 'clockwise', 0, 4, 6), turn(0.25, 'counterclockwise', 20, 6, 5)])).toBeCloseTo(
      4,
      9,
    );
  });

  it('is negative where clockwise lowered it', () => {
    const log = [turn(0.5, 'clockwise', 0, 8, 6), turn(0.25, 'counterclockwise', 20, 6, 7)];
    expect(inDegF(log)).toBeCloseTo(-4, 9);
  });

  it('passes over readings that are no numbers', () => {
    expect(inDegF([turn(0.5, 'clockwise', 0, 4, 6), turn(0.5, 'clockwise', 20, NaN, 6)])).toBeNull();
  });

  it('finds the response of a valve that answers in proportion', () => {
    const cases = fc.record({
      perTurn: fc.double({ min: -10, max: 10, noNaN: true }),
      turns: fc.array(fc.integer({ min: 1, max: 8 }), { minLength: 2, maxLength: 6 }),
    });
    fc.assert(
      fc.property(cases, ({ perTurn, turns }) => {
        const log = turns.map((eighth, index) => {
          const direction = index % 2 === 0 ? 'clockwise' : 'counterclockwise';
          const change = (perTurn * eighth * (index % 2 === 0 ? 1 : -1)) / 8;
          return turn(eighth / 8, direction, index * 20, 10, 10 + change);
        });
        expect(inDegF(log)).toBeCloseTo(perTurn, 9);
      }),
    );
  });
});

describe('isAgainstSheet', () => {
  it.each([
    ['clockwise', 6, 4, 'raisesSuperheat', true],
    ['clockwise', 4, 6, 'raisesSuperheat', false],
    ['clockwise', 4, 6, 'lowersSuperheat', true],
    ['counterclockwise', 4, 6, 'raisesSuperheat', true],
    ['counterclockwise', 4, 6, 'lowersSuperheat', false],
    ['clockwise', 4, 3.5, 'raisesSuperheat', false],
    ['clockwise', 6, 4, null, false],
  ] as const)(
    '%s from %d to %d °F where the sheet says %s: %s',
    (direction, before, after, sheet, expected) => {
      expect(isAgainstSheet([turn(0.5, direction, 0, before, after)], sheet)).toBe(expected);
    },
  );

  it('goes by the last turn that was read, and by none when none was', () => {
    const wrong = turn(0.5, 'clockwise', 0, 6, 4);
    const right = turn(0.5, 'clockwise', 20, 4, 6);
    expect(isAgainstSheet([wrong, right], 'raisesSuperheat')).toBe(false);
    expect(isAgainstSheet([right, wrong, turn(0.5, 'clockwise', 40)], 'raisesSuperheat')).toBe(true);
    expect(isAgainstSheet([turn(0.5, 'clockwise')], 'raisesSuperheat')).toBe(false);
  });
});
