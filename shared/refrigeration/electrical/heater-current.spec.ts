import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { ampere, volt, watt, type Ampere } from '../../units/quantity';
import {
  DEFAULT_HEATER_TOLERANCE,
  expectedHeaterCurrent,
  judgeHeaterCurrent,
  type HeaterCurrentInputs,
  type HeaterCurrentResult,
  type HeaterRating,
} from './heater-current';

type Answer = Extract<HeaterCurrentResult, { ok: true }>;

const powerRating = (watts: number, volts: number): HeaterRating => ({
  kind: 'power',
  power: watt(watts),
  voltage: volt(volts),
});
const amperes = (...values: number[]): Ampere[] => values.map(ampere);

const INPUTS: HeaterCurrentInputs = {
  supply: 'threePhase',
  rating: powerRating(6000, 208),
  measuredVoltage: volt(208),
  legs: amperes(16.6, 16.7, 16.5),
};

function answer(change: Partial<HeaterCurrentInputs> = {}): Answer {
  const result = judgeHeaterCurrent({ ...INPUTS, ...change });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

describe('expectedHeaterCurrent', () => {
  // Ohm's law, worked by hand.
  it('is P ÷ (√3·V) on three phases and P ÷ V on one', () => {
    expect(expectedHeaterCurrent('threePhase', powerRating(6000, 208), volt(208))).toBeCloseTo(16.65, 2);
    expect(expectedHeaterCurrent('onePhase', powerRating(3000, 208), volt(208))).toBeCloseTo(14.42, 2);
    // An element of 21.6 Ω.
    expect(expectedHeaterCurrent('onePhase', powerRating(2000, 208), volt(208))).toBeCloseTo(208 / 21.63, 2);
  });

  it('scales nameplate amperes with the voltage, when the nameplate says at which', () => {
    const rating = (voltage: number | null): HeaterRating => ({
      kind: 'current',
      current: ampere(20),
      voltage: voltage === null ? null : volt(voltage),
    });
    expect(expectedHeaterCurrent('threePhase', rating(240), volt(208))).toBeCloseTo((20 * 208) / 240, 9);
    expect(expectedHeaterCurrent('threePhase', rating(null), volt(208))).toBe(20);
  });
});

describe('judgeHeaterCurrent', () => {
  it.each([
    [240, 208, 0.751],
    [480, 460, 0.918],
    [208, 208, 1],
  ])('rated %d V on %d V gives %d of the power', (rated, measured, share) => {
    const result = answer({ rating: powerRating(1000, rated), measuredVoltage: volt(measured) });
    expect(result.expectedPower / 1000).toBeCloseTo(share, 3);
  });

  it('passes legs near the expected current', () => {
    const result = answer();
    expect(result).toMatchObject({ outcome: 'within', fault: null });
    expect(result.legs.map((leg) => leg.deviation)[0]).toBeCloseTo(16.6 / 16.6543 - 1, 4);
    expect(result.imbalance).toBeCloseTo(0.1 / 16.6, 9);
  });

  it('counts the tolerance itself as within, and takes a tenth by default', () => {
    const legs = (share: number): Ampere[] => {
      const current = expectedHeaterCurrent('threePhase', INPUTS.rating, volt(208)) * share;
      return amperes(current, current, current);
    };
    expect(DEFAULT_HEATER_TOLERANCE).toBe(0.1);
    expect(answer({ legs: legs(0.9) }).outcome).toBe('within');
    expect(answer({ legs: legs(1.1) }).outcome).toBe('within');
    expect(answer({ legs: legs(0.8999) }).outcome).toBe('outside');
    expect(answer({ legs: legs(0.9), tolerance: 0.05 }).outcome).toBe('outside');
  });

  it('tells which leg is outside', () => {
    const { outcome, legs } = answer({ legs: amperes(16.6, 13, 16.6) });
    expect(outcome).toBe('outside');
    expect(legs.map((leg) => leg.outcome)).toEqual(['within', 'outside', 'within']);
  });

  // Kirchhoff's laws on three equal resistances, worked by hand; 16.65 A when whole.
  it.each([
    ['an open line, or an open element of a wye', [14.42, 0, 14.42], 'lineOrWyeElementOpen', [1]],
    ['an open element of a wye with neutral', [0, 16.65, 16.65], 'wyeElementOpenWithNeutral', [0]],
    ['an open element of a delta', [9.61, 16.65, 9.61], 'deltaElementOpen', [0, 2]],
    ['two open elements of a delta', [9.61, 9.61, 0.2], 'twoDeltaElementsOpen', [2]],
    ['a dead leg and no pattern', [12, 0, 16], 'legOpen', [1]],
    ['two dead legs', [0, 0, 16], 'legOpen', [0, 1]],
    ['nothing', [0, 0, 0], 'noCurrent', [0, 1, 2]],
  ])('knows %s', (_, currents, pattern, legs) => {
    const result = answer({ legs: amperes(...currents) });
    expect(result).toMatchObject({ outcome: 'outside', fault: { pattern, legs } });
  });

  it('names no fault when legs are low without a pattern', () => {
    expect(answer({ legs: amperes(12, 14, 16) }).fault).toBeNull();
  });

  it('judges one phase by its one current', () => {
    const one = { supply: 'onePhase', rating: powerRating(3000, 208) } as const;
    expect(answer({ ...one, legs: amperes(14.4) })).toMatchObject({ outcome: 'within', imbalance: null });
    expect(answer({ ...one, legs: amperes(0) }).fault).toEqual({ pattern: 'noCurrent', legs: [0] });
  });

  it('shows its working, deviations last', () => {
    const { working, legs } = answer();
    expect(working.formula).toBe('heaterCurrentThreePhase');
    expect(working.lines.map((line) => line.label)).toEqual([
      ...['ratedPower', 'ratedVoltage', 'measuredVoltage', 'expectedPower', 'expectedCurrent', 'tolerance'],
      ...['leg1Current', 'leg2Current', 'leg3Current', 'leg1Deviation', 'leg2Deviation', 'leg3Deviation'],
    ]);
    expect(working.lines.at(-1)).toEqual({
      label: 'leg3Deviation',
      value: legs[2]?.deviation,
      unit: 'fraction',
    });
  });

  const refusals: readonly (readonly [string, Partial<HeaterCurrentInputs>])[] = [
    ['notFinite', { measuredVoltage: volt(NaN) }],
    ['notFinite', { legs: amperes(16, NaN, 16) }],
    ['notFinite', { tolerance: NaN }],
    ['notPositive', { measuredVoltage: volt(0) }],
    ['notPositive', { rating: powerRating(0, 208) }],
    ['notPositive', { rating: powerRating(6000, -208) }],
    ['wrongNumberOfLegs', { legs: amperes(16, 16) }],
    ['wrongNumberOfLegs', { supply: 'onePhase' }],
    ['negativeCurrent', { legs: amperes(16, -16, 16) }],
    ['toleranceNotAFraction', { tolerance: -0.1 }],
    ['toleranceNotAFraction', { tolerance: 10 }],
  ];
  it.each(refusals)('refuses: %s (case %#)', (reason, change) => {
    expect(judgeHeaterCurrent({ ...INPUTS, ...change })).toEqual({ ok: false, reason });
  });

  it('does not depend on the order of the legs', () => {
    const current = fc.oneof(
      fc.constantFrom(0, 9.61, 14.42, 16.65),
      fc.double({ min: 0, max: 30, noNaN: true }),
    );
    fc.assert(
      fc.property(current, current, current, (a, b, c) => {
        const one = answer({ legs: amperes(a, b, c) });
        const other = answer({ legs: amperes(c, a, b) });
        expect(other.outcome).toBe(one.outcome);
        expect(other.fault?.pattern).toBe(one.fault?.pattern);
        expect(other.imbalance ?? -1).toBeCloseTo(one.imbalance ?? -1, 9);
      }),
    );
  });

  it('expects more at a higher voltage, in proportion', () => {
    const volts = fc.double({ min: 100, max: 600, noNaN: true });
    fc.assert(
      fc.property(volts, volts, (low, high) => {
        const at = (measured: number): Answer => answer({ measuredVoltage: volt(measured) });
        expect(at(high).expected / at(low).expected).toBeCloseTo(high / low, 9);
        expect(at(high).expectedPower / at(low).expectedPower).toBeCloseTo((high / low) ** 2, 9);
      }),
    );
  });
});
