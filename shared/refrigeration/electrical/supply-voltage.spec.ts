import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { volt, type Volt } from '../../units/quantity';
import {
  judgeSupplyVoltage,
  type SupplyVoltageInputs,
  type SupplyVoltageResult,
  type SupplyProblem,
} from './supply-voltage';

type Answer = Extract<SupplyVoltageResult, { ok: true }>;

const three = (a: number, b: number, c: number): readonly [Volt, Volt, Volt] => [volt(a), volt(b), volt(c)];

function answer(
  nameplate: number,
  voltages: SupplyVoltageInputs['voltages'],
  limits: Partial<SupplyVoltageInputs> = {},
): Answer {
  const result = judgeSupplyVoltage({ nameplateVoltage: volt(nameplate), voltages, ...limits });
  if (!result.ok) throw new Error(result.reason);
  return result;
}

describe('judgeSupplyVoltage', () => {
  // NEMA MG 1 definition of unbalance; worked examples of public pages.
  it.each([
    [460, 460, 467, 450, 1.96],
    [208, 220, 216, 213, 1.69],
    [460, 462, 463, 455, 1.09],
  ])('nameplate %d V, %d %d %d V: within, %d %% unbalanced', (nameplate, a, b, c, percent) => {
    const result = answer(nameplate, three(a, b, c));
    expect((result.unbalance ?? NaN) * 100).toBeCloseTo(percent, 2);
    expect(result).toMatchObject({ outcome: 'within', problems: [] });
  });

  // NEMA MG 1, 12.44: ±10 % of the nameplate voltage.
  it.each<readonly [readonly [Volt, Volt, Volt], readonly SupplyProblem[]]>([
    [three(414, 414, 414), []],
    [three(506, 506, 506), []],
    [three(413, 413, 413), ['low']],
    [three(507, 507, 507), ['high']],
    [three(413, 460, 507), ['low', 'high', 'unbalanced']],
    [three(460, 470, 445), ['unbalanced']],
    [three(0, 460, 460), ['lost']],
  ])('nameplate 460 V, %j V: %j', (voltages, problems) => {
    const result = answer(460, voltages);
    expect(result.problems).toEqual(problems);
    expect(result.outcome).toBe(problems.length === 0 ? 'within' : 'outside');
  });

  it('takes its limits from the template', () => {
    expect(answer(460, three(460, 467, 450), { greatestUnbalance: 0.01 }).problems).toEqual(['unbalanced']);
    expect(answer(460, three(430, 430, 430), { voltageTolerance: 0.05 }).problems).toEqual(['low']);
    expect(answer(460, three(460, 470, 445), { greatestUnbalance: 0.05 }).problems).toEqual([]);
  });

  it('judges one phase without unbalance', () => {
    expect(answer(208, [volt(200)])).toMatchObject({ outcome: 'within', unbalance: null });
    expect(answer(208, [volt(180)])).toMatchObject({ outcome: 'outside', problems: ['low'] });
  });

  it('shows its working, unbalance last', () => {
    const { working, unbalance } = answer(460, three(460, 467, 450));
    expect(working.formula).toBe('supplyVoltage');
    expect(working.lines).toContainEqual({ label: 'voltage2', value: 467, unit: 'V' });
    expect(working.lines.at(-1)).toEqual({ label: 'unbalance', value: unbalance, unit: 'fraction' });
  });

  it.each([
    ['notFinite', 460, three(460, NaN, 460), {}],
    ['notFinite', NaN, three(460, 460, 460), {}],
    ['notFinite', 460, three(460, 460, 460), { greatestUnbalance: NaN }],
    ['notPositive', 0, three(460, 460, 460), {}],
    ['notPositive', 460, three(460, -460, 460), {}],
    ['limitNotAFraction', 460, three(460, 460, 460), { greatestUnbalance: 2 }],
    ['limitNotAFraction', 460, three(460, 460, 460), { voltageTolerance: -0.1 }],
  ])('refuses: %s (case %#)', (reason, nameplate, voltages, limits) => {
    const result = judgeSupplyVoltage({ nameplateVoltage: volt(nameplate), voltages, ...limits });
    expect(result).toEqual({ ok: false, reason });
  });

  it('does not depend on the order of the lines', () => {
    const voltage = fc.double({ min: 0, max: 600, noNaN: true });
    fc.assert(
      fc.property(voltage, voltage, voltage, (a, b, c) => {
        const one = answer(460, three(a, b, c));
        const other = answer(460, three(b, c, a));
        expect(other.problems).toEqual(one.problems);
        expect(other.unbalance ?? -1).toBeCloseTo(one.unbalance ?? -1, 9);
      }),
    );
  });
});
