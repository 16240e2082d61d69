import { describe, expect, it } from '@jest/globals';
import { checkDefrostPlan } from './check-defrost-plan';
import {
  USUAL_DEFROST_RULES,
  type DefrostCircuit,
  type DefrostPlan,
  type DefrostRules,
} from './defrost-plan-types';
import { at, circuit, freeRules, storeOf } from './defrost.fixture';
import { planDefrosts } from './plan-defrosts';

const planOf = (circuits: readonly DefrostCircuit[], rules: DefrostRules): DefrostPlan => {
  const result = planDefrosts(circuits, rules);
  if (!result.ok) throw new Error(JSON.stringify(result));
  expect(checkDefrostPlan(circuits, rules, result.plan)).toMatchObject({ ok: true, breaches: [] });
  return result.plan;
};

const blocked = (circuits: readonly DefrostCircuit[], rules: DefrostRules): unknown => {
  const result = planDefrosts(circuits, rules);
  if (result.ok || result.reason !== 'blocked') throw new Error(JSON.stringify(result));
  return result;
};

describe('planDefrosts', () => {
  it('spreads one circuit evenly', () => {
    expect(planOf([circuit('c', { perDay: 4 })], USUAL_DEFROST_RULES)).toEqual([
      { circuitId: 'c', startsS: [at(0), at(6), at(12), at(18)] },
    ]);
  });

  it('plans nothing for circuits that never defrost, but counts their load', () => {
    const circuits = [circuit('a'), circuit('b'), circuit('n', { type: 'none', perDay: 3, loadW: 6000 })];
    const result = planDefrosts(circuits, freeRules({ largestShareOfLoad: 0.25 }));
    expect(result).toMatchObject({ ok: true, notes: [] });
    expect(result.ok && result.plan.map(({ circuitId }) => circuitId)).toEqual(['a', 'b']);
    expect(planDefrosts([], USUAL_DEFROST_RULES)).toMatchObject({ ok: true, plan: [] });
  });

  it('goes round quiet hours that no even spacing can avoid', () => {
    const rules = freeRules({ quietHours: [{ fromS: at(20), toS: at(4) }] });
    const [entry] = planOf([circuit('c', { perDay: 4 })], rules);
    expect(entry?.startsS).toHaveLength(4);
  });

  it('keeps hand-set starts, off the grid too, and adds the missing ones', () => {
    const fixed = circuit('f', { perDay: 3, fixedStartsS: [at(1, 7)] });
    const rules = { ...USUAL_DEFROST_RULES, largestShareOfLoad: 0.5 };
    const plan = planOf([fixed, circuit('g', { perDay: 3 })], rules);
    expect(plan[0]?.startsS).toContain(at(1, 7));
    const all = [at(1, 7), at(11, 1), at(19, 59)];
    expect(planOf([circuit('f', { perDay: 3, fixedStartsS: all })], rules)[0]?.startsS).toEqual(all);
  });

  it('loses no second to a hand-set start off the grid', () => {
    const first = circuit('f', { box: '1', durationS: at(11, 59), fixedStartsS: [at(0, 1)] });
    const second = circuit('g', { box: '1', durationS: at(11, 59), dripS: 60 });
    const rules = freeRules({ stepS: at(12) });
    expect(planOf([first, second], rules)[1]?.startsS).toEqual([at(12)]);
  });

  it('plans 60 circuits, the same each time', () => {
    const rules = { ...USUAL_DEFROST_RULES, largestHeaterDemandW: 8000, leastRunningShareForHotGas: 0.75 };
    const store = storeOf(60);
    const plan = planOf(store, rules);
    expect(plan).toHaveLength(60);
    expect(planDefrosts(store, rules)).toMatchObject({ plan });
  });

  it('shows its working', () => {
    const result = planDefrosts(storeOf(15), { ...USUAL_DEFROST_RULES, largestHeaterDemandW: 9000 });
    const lines = result.ok ? result.working.lines : [];
    const valueOf = (label: string): number => lines.find((line) => line.label === label)?.value ?? NaN;
    expect(valueOf('circuits')).toBe(15);
    expect(valueOf('defrosts')).toBe(22);
    expect(valueOf('peakShareOfLoad')).toBeLessThanOrEqual(0.25);
    expect(valueOf('peakHeaterDemand')).toBeLessThanOrEqual(valueOf('largestHeaterDemand'));
  });

  it('gives back figures that nothing can be planned with', () => {
    expect(planDefrosts([circuit('a', { durationS: NaN })], USUAL_DEFROST_RULES)).toEqual({
      ok: false,
      reason: 'inputProblems',
      problems: [{ circuitId: 'a', field: 'durationS' }],
    });
  });
});

describe('planDefrosts says what is in the way', () => {
  const pair = (change: Partial<DefrostCircuit>): readonly DefrostCircuit[] => [
    circuit('a', { perDay: 2, durationS: at(7), ...change }),
    circuit('b', { perDay: 2, durationS: at(7), ...change }),
  ];
  const hotGas = { type: 'hotGas' } as const;
  const electric = { type: 'electric', heaterW: 6000 } as const;
  const fixedStartsS = [at(0), at(12)];

  it.each<[string, readonly DefrostCircuit[], Partial<DefrostRules>, readonly string[]]>([
    ['quietHours', pair({}), { quietHours: [{ fromS: at(1), toS: at(0) }] }, ['a', 'b']],
    ['shareOfLoad', pair({}), { largestShareOfLoad: 0.5 }, ['a', 'b']],
    ['shareInHotGas', pair(hotGas), { largestShareInHotGas: 0.5 }, ['a', 'b']],
    ['runningLoadForHotGas', pair(hotGas), { leastRunningLoadForHotGasW: 1 }, ['a', 'b']],
    ['runningLoadForHotGas', pair(hotGas), { leastRunningShareForHotGas: 0.1 }, ['a', 'b']],
    ['heaterDemand', pair(electric), { largestHeaterDemandW: 11_999 }, ['a', 'b']],
    ['heaterDemand', [circuit('a', { type: 'electric' })], { largestHeaterDemandW: 1e6 }, ['a']],
    ['sharedBox', pair({ box: '1' }), {}, ['a', 'b']],
    ['sharedAirCurtain', pair({ airCurtain: '1' }), {}, ['a', 'b']],
    ['gapBetweenStarts', pair({ perDay: 4, durationS: 60 }), { leastGapBetweenStartsS: at(4) }, ['a', 'b']],
    ['fixedStarts', [circuit('a', { perDay: 2, fixedStartsS: [at(0), at(1)] })], {}, ['a']],
    ['tooClose', [circuit('a', { perDay: 2, durationS: at(13) })], {}, ['a']],
  ])('%s', (rule, circuits, change, circuitIds) => {
    const result = blocked(circuits, freeRules(change)) as { blockedBy: { circuitIds: string[] }[] };
    expect(result).toMatchObject({ proven: true, blockedBy: [{ rule, onlyWith: [] }] });
    expect([...(result.blockedBy[0]?.circuitIds ?? [])].sort()).toEqual(circuitIds);
  });

  it('names each of two rules when either is enough', () => {
    const circuits = [
      circuit('a', { box: '1', fixedStartsS: [0] }),
      circuit('b', { box: '1', fixedStartsS: [0] }),
    ];
    expect(blocked(circuits, freeRules())).toMatchObject({
      blockedBy: [
        { rule: 'fixedStarts', onlyWith: [] },
        { rule: 'sharedBox', onlyWith: [] },
      ],
    });
  });

  it('names two together when neither is enough', () => {
    expect(blocked(pair({ box: '1', airCurtain: '1', fixedStartsS }), freeRules())).toMatchObject({
      blockedBy: [
        { rule: 'sharedBox', onlyWith: ['sharedAirCurtain'] },
        { rule: 'sharedAirCurtain', onlyWith: ['sharedBox'] },
      ],
    });
  });

  it('plans the others all the same, and breaks no rule among them', () => {
    const circuits = [...pair({ box: '1' }), circuit('c'), circuit('d', { groupId: 'other' })];
    const result = planDefrosts(circuits, freeRules());
    if (result.ok || result.reason !== 'blocked') throw new Error('not blocked');
    expect(result.unplacedIds).toEqual(['b']);
    expect(result.partialPlan.map(({ circuitId }) => circuitId)).toEqual(['a', 'c', 'd']);
    const check = checkDefrostPlan(circuits, freeRules(), result.partialPlan);
    expect(check.ok && check.breaches.map(({ rule, circuitIds }) => [rule, circuitIds])).toEqual([
      ['startsPerDay', ['b']],
    ]);
  });
});
