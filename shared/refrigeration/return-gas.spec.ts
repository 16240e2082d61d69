import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from '../units/convert';
import { addDifference, kelvin, kelvinDifference, pascalGauge, type Kelvin } from '../units/quantity';
import { SEA_LEVEL_ATMOSPHERE, toAbsolute } from './gauge-pressure';
import {
  fahrenheit,
  fahrenheitDifference,
  inFahrenheitDifference,
  psig,
  refrigerant,
} from './readings.fixture';
import {
  DEFAULT_RETURN_GAS_SUPERHEAT_LOW,
  judgeReturnGas,
  type ReturnGasInputs,
  type ReturnGasLimits,
  type ReturnGasResult,
} from './return-gas';
import { dewTemperature } from './saturation/saturation-curve';

type Answer = Extract<ReturnGasResult, { ok: true }>;

const LIMITS: ReturnGasLimits = {
  superheatLow: DEFAULT_RETURN_GAS_SUPERHEAT_LOW,
  superheatHigh: null,
  returnGasHigh: null,
  dischargeHigh: null,
};

const INPUTS: ReturnGasInputs = {
  table: refrigerant('R-744'),
  suctionPressure: psig(200),
  atmosphere: SEA_LEVEL_ATMOSPHERE,
  returnGasTemperature: fahrenheit(10),
  dischargeTemperature: null,
  limits: LIMITS,
};

function dew(): Kelvin {
  const result = dewTemperature(INPUTS.table, toAbsolute(INPUTS.suctionPressure, INPUTS.atmosphere));
  if (!result.ok) throw new Error(result.reason);
  return result.temperature;
}

const DEW = dew();

function answer(change: Partial<ReturnGasInputs> = {}): Answer {
  const result = judgeReturnGas({ ...INPUTS, ...change });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const withSuperheat = (degF: number, limits: Partial<ReturnGasLimits> = {}): Answer =>
  answer({
    returnGasTemperature: addDifference(DEW, fahrenheitDifference(degF)),
    limits: { ...LIMITS, ...limits },
  });

describe('judgeReturnGas', () => {
  // A difference of 10 K is 18 °F; 50 °F is the temperature 10 °C.
  it('takes 10 K as a difference of 18 °F and never as 50 °F', () => {
    expect(inFahrenheitDifference(DEFAULT_RETURN_GAS_SUPERHEAT_LOW)).toBeCloseTo(18, 12);
    expect(withSuperheat(17.9)).toMatchObject({ outcome: 'outside', side: 'low' });
    expect(withSuperheat(18)).toMatchObject({ outcome: 'within', side: null });
    expect(withSuperheat(18.1)).toMatchObject({ outcome: 'within', side: null });
    expect(withSuperheat(49.9)).toMatchObject({ outcome: 'within', side: null });
  });

  // R-744 at 200 psig and −10 °F has 10.1 °F (CoolProp).
  it('tells of liquid coming back', () => {
    const result = answer({ returnGasTemperature: fahrenheit(-10) });
    expect(Math.abs(inFahrenheitDifference(result.superheat) - 10.1)).toBeLessThanOrEqual(0.3);
    expect(result).toMatchObject({
      outcome: 'outside',
      side: 'low',
      consequence: 'liquidFloodback',
      breaches: ['superheatLow'],
      saturation: DEW,
    });
  });

  // Installation manual of a maker of condensing units, compressor superheat: no less than 20 °F.
  it.each([
    [19.9, 'outside'],
    [20, 'within'],
    [30, 'within'],
  ])('by a condensing unit’s manual %d °F is %s', (degF, outcome) => {
    expect(withSuperheat(degF, { superheatLow: fahrenheitDifference(20) }).outcome).toBe(outcome);
  });

  // Application guideline of a maker of scroll compressors: 5 to 30 K (9 to 54 °F).
  it.each([
    [8.9, 'low', 'liquidFloodback'],
    [9, null, null],
    [18, null, null],
    [54, null, null],
    [54.1, 'high', 'hotDischarge'],
  ])('by a scroll’s guideline %d °F is %s: %s', (degF, side, consequence) => {
    const limits = { superheatLow: kelvinDifference(5), superheatHigh: kelvinDifference(30) };
    expect(withSuperheat(degF, limits)).toMatchObject({ side, consequence });
  });

  // 65 °F: a common rating point of return gas for low temperature.
  it('lets the maker limit the return gas', () => {
    const at = (degF: number): Answer =>
      answer({
        returnGasTemperature: fahrenheit(degF),
        limits: { ...LIMITS, returnGasHigh: fahrenheit(65) },
      });
    expect(at(65).outcome).toBe('within');
    expect(at(65.1)).toMatchObject({
      side: 'high',
      consequence: 'hotDischarge',
      breaches: ['returnGasHigh'],
    });
  });

  it('lets the maker limit the discharge, and says when nobody measured it', () => {
    const limits = { ...LIMITS, dischargeHigh: fahrenheit(250) };
    const at = (dischargeTemperature: Kelvin | null): Answer => answer({ limits, dischargeTemperature });
    expect(at(fahrenheit(250))).toMatchObject({ outcome: 'within', dischargeJudged: true });
    expect(at(fahrenheit(251))).toMatchObject({
      side: 'high',
      consequence: 'hotDischarge',
      breaches: ['dischargeHigh'],
    });
    expect(at(null)).toMatchObject({ outcome: 'within', dischargeJudged: false });
    expect(answer().dischargeJudged).toBe(true);
  });

  it('puts liquid before heat when both are wrong, and names both', () => {
    const result = answer({
      returnGasTemperature: fahrenheit(-10),
      dischargeTemperature: fahrenheit(260),
      limits: { ...LIMITS, dischargeHigh: fahrenheit(250) },
    });
    expect(result).toMatchObject({ side: 'low', consequence: 'liquidFloodback' });
    expect(result.breaches).toEqual(['superheatLow', 'dischargeHigh']);
  });

  it('never passes saturated or wet gas, whatever the limit', () => {
    expect(withSuperheat(0, { superheatLow: kelvinDifference(0) }).side).toBe('low');
    expect(withSuperheat(-2, { superheatLow: kelvinDifference(-10) }).side).toBe('low');
  });

  it('shows its working with the limits, the superheat last', () => {
    const { working, superheat } = withSuperheat(20, { superheatHigh: kelvinDifference(30) });
    expect(working.formula).toBe('returnGasSuperheat');
    expect(working.lines.map(({ label }) => label).slice(-4)).toEqual([
      ...['returnGasTemperature', 'superheatLow', 'superheatHigh', 'superheat'],
    ]);
    expect(working.lines.at(-1)).toEqual({ label: 'superheat', value: superheat, unit: 'K_diff' });
  });

  const refusals: readonly (readonly [string, Partial<ReturnGasInputs>])[] = [
    ['notFinite', { returnGasTemperature: kelvin(NaN) }],
    ['notFinite', { suctionPressure: pascalGauge(NaN) }],
    ['notFinite', { dischargeTemperature: kelvin(NaN) }],
    ['notFinite', { limits: { ...LIMITS, superheatLow: kelvinDifference(NaN) } }],
    ['notFinite', { limits: { ...LIMITS, superheatHigh: kelvinDifference(NaN) } }],
    ['notFinite', { limits: { ...LIMITS, returnGasHigh: kelvin(NaN) } }],
    ['belowAbsoluteZero', { returnGasTemperature: kelvin(0) }],
    ['belowAbsoluteZero', { dischargeTemperature: kelvin(-1) }],
    ['limitsContradict', { limits: { ...LIMITS, superheatHigh: kelvinDifference(5) } }],
    ['aboveCritical', { suctionPressure: psig(1060) }],
    ['belowTable', { suctionPressure: psig(45) }],
  ];
  it.each(refusals)('refuses: %s (case %#)', (reason, change) => {
    expect(judgeReturnGas({ ...INPUTS, ...change })).toEqual({ ok: false, reason });
  });

  it('stays dry when the gas gets warmer, and does not depend on the unit', () => {
    const degrees = fc.double({ min: -30, max: 60, noNaN: true });
    fc.assert(
      fc.property(degrees, degrees, (a, b) => {
        const colder = answer({ returnGasTemperature: fahrenheit(Math.min(a, b)) });
        const warmer = answer({ returnGasTemperature: fahrenheit(Math.max(a, b)) });
        if (colder.side !== 'low') expect(warmer.side).not.toBe('low');
        const celsius = kelvin(toSi(((a - 32) * 5) / 9, 'degC'));
        const other = answer({ returnGasTemperature: celsius });
        expect(other.superheat).toBeCloseTo(answer({ returnGasTemperature: fahrenheit(a) }).superheat, 9);
      }),
    );
  });
});
