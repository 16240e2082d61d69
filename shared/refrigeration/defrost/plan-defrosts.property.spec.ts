import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { checkDefrostPlan } from './check-defrost-plan';
import { DAY_S } from './day-circle';
import type { DefrostCircuit, DefrostRules } from './defrost-plan-types';
import { circuit, freeRules, HOUR_S } from './defrost.fixture';
import { exhaustivePlan } from './exhaustive-defrost-plan.fixture';
import { planDefrosts } from './plan-defrosts';

const STEP_S = 2 * HOUR_S;
const hours = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: min * 2, max: max * 2 }).map((halves) => (halves * HOUR_S) / 2);
const oneOf = <T>(...values: readonly T[]): fc.Arbitrary<T> => fc.constantFrom(...values);

const someCircuit: fc.Arbitrary<Partial<DefrostCircuit>> = fc.record({
  groupId: oneOf('g', 'g', 'h'),
  type: oneOf('offTime', 'electric', 'hotGas', 'hotGas', 'none'),
  perDay: oneOf(1, 2, 2, 3, 4),
  durationS: hours(0.5, 5),
  dripS: hours(0, 1),
  loadW: oneOf(1000, 2000, 5000, null),
  heaterW: oneOf(3000, 6000, null),
  box: oneOf(null, null, '1'),
  airCurtain: oneOf(null, null, '1'),
});

const someCircuits = fc
  .array(someCircuit, { minLength: 2, maxLength: 4 })
  .map((changes) => changes.map((change, index) => circuit(`c${index}`, change)));

const someRules: fc.Arbitrary<DefrostRules> = fc
  .record({
    largestShareOfLoad: oneOf(0.25, 0.5, 0.75, 1),
    largestShareInHotGas: oneOf(1 / 3, 0.5, 1),
    leastRunningLoadForHotGasW: oneOf(null, null, 1000, 3000),
    leastRunningShareForHotGas: oneOf(null, null, 0.25),
    leastGapBetweenStartsS: oneOf(0, HOUR_S, STEP_S, 2 * STEP_S),
    largestHeaterDemandW: oneOf(null, 6000, 9000),
    quietHours: fc.array(fc.record({ fromS: hours(0, 24), toS: hours(0, 24) }), { maxLength: 1 }),
  })
  .map((change) => freeRules({ ...change, stepS: STEP_S }));

describe('planDefrosts against every combination', () => {
  it('finds a plan wherever an even one exists, and none that breaks a rule', () => {
    const seen = { planned: 0, blocked: 0 };
    fc.assert(
      fc.property(someCircuits, someRules, (circuits, rules) => {
        const result = planDefrosts(circuits, rules);
        if (result.ok) {
          seen.planned++;
          expect(checkDefrostPlan(circuits, rules, result.plan)).toMatchObject({ ok: true, breaches: [] });
          return;
        }
        seen.blocked++;
        expect(result).toMatchObject({ reason: 'blocked', proven: true });
        expect(exhaustivePlan(circuits, rules)).toBeUndefined();
      }),
      { numRuns: 300, seed: 1 },
    );
    // Neither side of the comparison may be empty.
    expect(seen.planned).toBeGreaterThan(50);
    expect(seen.blocked).toBeGreaterThan(50);
  });

  it('never claims a plan where every even one breaks a rule and nothing is quiet', () => {
    fc.assert(
      fc.property(someCircuits, someRules, (circuits, rules) => {
        const open = { ...rules, quietHours: [] };
        expect(planDefrosts(circuits, open).ok).toBe(exhaustivePlan(circuits, open) !== undefined);
      }),
      { numRuns: 150, seed: 2 },
    );
  });

  it('answers the same when the clock is turned', () => {
    fc.assert(
      fc.property(someCircuits, someRules, fc.integer({ min: 1, max: 11 }), (circuits, rules, steps) => {
        const turn = (atS: number): number => (atS + steps * STEP_S) % DAY_S;
        const turned = rules.quietHours.map(({ fromS, toS }) => ({ fromS: turn(fromS), toS: turn(toS) }));
        // Turning would make nothing of a whole day.
        fc.pre(rules.quietHours.every(({ fromS, toS }) => Math.abs(toS - fromS) < DAY_S));
        const result = planDefrosts(circuits, { ...rules, quietHours: turned });
        expect(result.ok).toBe(planDefrosts(circuits, rules).ok);
      }),
      { numRuns: 150, seed: 3 },
    );
  });

  it('breaks no rule with what it could place, and a named rule stands in the way', () => {
    fc.assert(
      fc.property(someCircuits, someRules, (circuits, rules) => {
        const result = planDefrosts(circuits, rules);
        if (result.ok || result.reason !== 'blocked') return;
        expect(result.blockedBy.length).toBeGreaterThan(0);
        const check = checkDefrostPlan(circuits, rules, result.partialPlan);
        const breaches = check.ok ? check.breaches : [];
        expect(breaches.map(({ rule }) => rule)).toEqual(result.unplacedIds.map(() => 'startsPerDay'));
        expect(breaches.flatMap(({ circuitIds }) => circuitIds)).toEqual(result.unplacedIds);
      }),
      { numRuns: 150, seed: 4 },
    );
  });
});
