import { describe, expect, it } from '@jest/globals';
import { checkDefrostPlan } from './check-defrost-plan';
import type { DefrostBreach, DefrostNote } from './defrost-breach';
import { USUAL_DEFROST_RULES, type DefrostCircuit, type DefrostRules } from './defrost-plan-types';
import { at, circuit, freeRules, MINUTE_S } from './defrost.fixture';

type Starts = Readonly<Record<string, readonly number[]>>;

const check = (
  circuits: readonly DefrostCircuit[],
  rules: DefrostRules,
  starts: Starts,
): { breaches: readonly DefrostBreach[]; notes: readonly DefrostNote[] } => {
  const plan = Object.entries(starts).map(([circuitId, startsS]) => ({ circuitId, startsS }));
  const result = checkDefrostPlan(circuits, rules, plan);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result;
};

const four = ['a', 'b', 'c', 'd'].map((id) => circuit(id));
const apart: Starts = { a: [at(0)], b: [at(3)], c: [at(6)], d: [at(9)] };

describe('checkDefrostPlan, each rule broken by hand', () => {
  it('finds nothing in a plan that keeps the usual rules', () => {
    expect(check(four, USUAL_DEFROST_RULES, apart)).toEqual({ ok: true, breaches: [], notes: [] });
  });

  // A quarter of the load: common practice, no source.
  it('allows exactly a quarter of the load and no more', () => {
    const eight = Array.from({ length: 8 }, (_, index) => circuit(`c${index}`));
    const starts = Object.fromEntries(eight.map(({ id }, index) => [id, [at(3 * index)]]));
    const rules = freeRules({ largestShareOfLoad: 0.25 });
    expect(check(eight, rules, { ...starts, c1: [at(0, 29)] }).breaches).toEqual([]);
    // One ends as the other begins: never three at once.
    expect(check(eight, rules, { ...starts, c1: [at(0, 15)], c2: [at(23, 45)] }).breaches).toEqual([]);
    expect(check(eight, rules, { ...starts, c1: [at(0, 5)], c2: [at(23, 45)] }).breaches).toEqual([
      { rule: 'shareOfLoad', circuitIds: ['c0', 'c1', 'c2'], atS: at(0, 5), value: 0.375, limit: 0.25 },
    ]);
  });

  it('counts drip as defrost', () => {
    const pair = [circuit('a', { dripS: 600 }), circuit('b')];
    const rules = freeRules({ largestShareOfLoad: 0.6 });
    expect(check(pair, rules, { a: [at(23, 50)], b: [at(0, 29)] }).breaches).toEqual([
      { rule: 'shareOfLoad', circuitIds: ['b', 'a'], atS: at(0, 29), value: 1, limit: 0.6 },
    ]);
    expect(check(pair, rules, { a: [at(23, 50)], b: [at(0, 30)] }).breaches).toEqual([]);
  });

  it('allows a circuit over the share alone, with a note, and not with another', () => {
    const pair = [circuit('a', { loadW: 9000, perDay: 2 }), circuit('b')];
    const rules = freeRules({ largestShareOfLoad: 0.25 });
    const alone = check(pair, rules, { a: [0, at(12)], b: [at(6)] });
    expect(alone.breaches).toEqual([]);
    expect(alone.notes).toEqual([
      { note: 'aloneOverShare', circuitIds: ['a'], atS: 0, value: 0.9, limit: 0.25 },
    ]);
    expect(check(pair, rules, { a: [0, at(12)], b: [at(12, 10)] }).breaches).toEqual([
      { rule: 'shareOfLoad', circuitIds: ['a', 'b'], atS: at(12, 10), value: 1, limit: 0.25 },
    ]);
  });

  it('judges a group with an unknown load by count and says so', () => {
    const pair = [circuit('a', { loadW: null }), circuit('b', { loadW: 9000 })];
    const result = check(pair, freeRules({ largestShareOfLoad: 0.5 }), { a: [0], b: [at(6)] });
    expect(result.breaches).toEqual([]);
    expect(result.notes).toEqual([
      { note: 'judgedByCount', circuitIds: ['a'], atS: null, value: null, limit: null },
    ]);
  });

  // A third of the hot-gas circuits: common practice, no source.
  it('allows a third of the hot-gas circuits by count and no more', () => {
    const six = Array.from({ length: 6 }, (_, index) =>
      circuit(`h${index}`, { type: 'hotGas', loadW: index === 0 ? 99_000 : 1000 }),
    );
    const starts = Object.fromEntries(six.map(({ id }, index) => [id, [at(3 * index)]]));
    const rules = freeRules({ largestShareInHotGas: 1 / 3 });
    expect(check(six, rules, { ...starts, h1: [at(0)] }).breaches).toEqual([]);
    expect(check(six, rules, { ...starts, h1: [at(0)], h2: [at(0, 10)] }).breaches).toEqual([
      { rule: 'shareInHotGas', circuitIds: ['h0', 'h1', 'h2'], atS: at(0, 10), value: 0.5, limit: 1 / 3 },
    ]);
  });

  it('notes a single hot-gas circuit over its share and leaves other types out of the count', () => {
    const pair = [circuit('a', { type: 'hotGas' }), circuit('b'), circuit('c', { type: 'electric' })];
    const result = check(pair, freeRules({ largestShareInHotGas: 1 / 3 }), { a: [0], b: [0], c: [0] });
    expect(result.breaches).toEqual([]);
    expect(result.notes).toEqual([
      { note: 'aloneOverHotGasShare', circuitIds: ['a'], atS: 0, value: 1, limit: 1 / 3 },
    ]);
  });

  it('wants running load for hot gas, in watts and as a share, whichever type takes it away', () => {
    const three = [circuit('a', { type: 'hotGas' }), circuit('b'), circuit('c', { type: 'none' })];
    const starts = { a: [at(23, 50)], b: [at(0, 10)] };
    const broken = { rule: 'runningLoadForHotGas', circuitIds: ['b', 'a'], atS: at(0, 10) };
    expect(check(three, freeRules({ leastRunningLoadForHotGasW: 1000 }), starts).breaches).toEqual([]);
    expect(check(three, freeRules({ leastRunningLoadForHotGasW: 1001 }), starts).breaches).toEqual([
      { ...broken, value: 1000, limit: 1001 },
    ]);
    const [byShare] = check(three, freeRules({ leastRunningShareForHotGas: 0.5 }), starts).breaches;
    expect(byShare).toMatchObject({ ...broken, limit: 0.5 });
    expect(byShare?.value).toBeCloseTo(1 / 3, 12);
    const without = [circuit('a'), circuit('b'), circuit('c', { type: 'none' })];
    expect(check(without, freeRules({ leastRunningLoadForHotGasW: 1001 }), starts).breaches).toEqual([]);
  });

  it('counts an unknown load as not running', () => {
    const pair = [circuit('a', { type: 'hotGas' }), circuit('b', { loadW: null, type: 'none' })];
    expect(check(pair, freeRules({ leastRunningLoadForHotGasW: 1 }), { a: [0] }).breaches).toMatchObject([
      { rule: 'runningLoadForHotGas', value: 0, limit: 1 },
    ]);
  });

  // 15 minutes between starts: common practice, no source.
  it('wants 15 minutes between starts of one group, round midnight, and not between groups', () => {
    const rules = freeRules({ leastGapBetweenStartsS: 15 * MINUTE_S });
    expect(check(four, rules, { ...apart, b: [at(23, 45)] }).breaches).toEqual([]);
    expect(check(four, rules, { ...apart, b: [at(23, 46)] }).breaches).toEqual([
      { rule: 'gapBetweenStarts', circuitIds: ['b', 'a'], atS: at(0), value: 840, limit: 900 },
    ]);
    const other = [circuit('a'), circuit('b', { groupId: 'other' })];
    expect(check(other, rules, { a: [0], b: [0] }).breaches).toEqual([]);
  });

  it('lets nothing reach into quiet hours, over midnight too', () => {
    const rules = freeRules({ quietHours: [{ fromS: at(22), toS: at(6) }] });
    const only = [circuit('a', { dripS: 600 })];
    expect(check(only, rules, { a: [at(21, 20)] }).breaches).toEqual([]);
    expect(check(only, rules, { a: [at(6)] }).breaches).toEqual([]);
    for (const startS of [at(21, 21), at(22), at(2), at(5, 59)])
      expect(check(only, rules, { a: [startS] }).breaches).toEqual([
        { rule: 'quietHours', circuitIds: ['a'], atS: startS, value: startS, limit: null },
      ]);
    expect(check(only, freeRules({ quietHours: [{ fromS: 60, toS: 60 }] }), { a: [0] }).breaches).toEqual([]);
    const whole = freeRules({ quietHours: [{ fromS: 0, toS: at(24) }] });
    expect(check(only, whole, { a: [at(12)] }).breaches).toHaveLength(1);
  });

  it('limits the heaters of all groups together while they heat, not while they drip', () => {
    const heater = (id: string): DefrostCircuit =>
      circuit(id, { groupId: id, type: 'electric', heaterW: 6000, dripS: 600 });
    const rules = freeRules({ largestHeaterDemandW: 10_000 });
    const pair = [heater('a'), heater('b')];
    expect(check(pair, rules, { a: [at(23, 45)], b: [at(0, 15)] }).breaches).toEqual([]);
    expect(check(pair, rules, { a: [at(23, 45)], b: [at(0, 14)] }).breaches).toEqual([
      { rule: 'heaterDemand', circuitIds: ['b', 'a'], atS: at(0, 14), value: 12_000, limit: 10_000 },
    ]);
    expect(check(pair, freeRules({ largestHeaterDemandW: 12_000 }), { a: [0], b: [0] }).breaches).toEqual([]);
  });

  it('lets no unknown heater pass a limit', () => {
    const only = [circuit('a', { type: 'electric', heaterW: null })];
    expect(check(only, freeRules({ largestHeaterDemandW: 1e6 }), { a: [0] }).breaches).toEqual([
      { rule: 'heaterDemand', circuitIds: ['a'], atS: 0, value: null, limit: 1e6 },
    ]);
    expect(check(only, freeRules(), { a: [0] }).breaches).toEqual([]);
  });

  it.each(['box', 'airCurtain'] as const)('keeps circuits of one %s apart, across groups too', (place) => {
    const pair = [
      circuit('a', { [place]: '7', dripS: 300 }),
      circuit('b', { [place]: '7', groupId: 'other' }),
    ];
    const rule = place === 'box' ? 'sharedBox' : 'sharedAirCurtain';
    expect(check(pair, freeRules(), { a: [at(23, 45)], b: [at(0, 20)] }).breaches).toEqual([]);
    for (const startS of [at(0, 19), at(23, 45)])
      expect(check(pair, freeRules(), { a: [at(23, 45)], b: [startS] }).breaches).toMatchObject([
        { rule, atS: startS },
      ]);
    const strangers = [circuit('a', { box: '7' }), circuit('b', { airCurtain: '7' }), circuit('c')];
    expect(check(strangers, freeRules(), { a: [0], b: [0], c: [0] }).breaches).toEqual([]);
  });

  it('wants at least half of the even spacing, and the time that a defrost takes', () => {
    const twice = [circuit('a', { perDay: 2 })];
    expect(check(twice, freeRules(), { a: [at(21), at(3)] }).breaches).toEqual([]);
    expect(check(twice, freeRules(), { a: [at(21, 1), at(3)] }).breaches).toEqual([
      { rule: 'tooClose', circuitIds: ['a'], atS: at(21, 1), value: 21_540, limit: 21_600 },
    ]);
    const long = [circuit('a', { perDay: 2, durationS: at(10) })];
    expect(check(long, freeRules(), { a: [0, at(9)] }).breaches).toMatchObject([
      { rule: 'tooClose', value: at(9), limit: at(10) },
    ]);
    const endless = [circuit('a', { durationS: at(25) })];
    expect(check(endless, freeRules(), { a: [0] }).breaches).toMatchObject([{ rule: 'tooClose' }]);
  });

  it('wants the right number of starts, the hand-set ones, and circuits and seconds that exist', () => {
    const fixed = [
      circuit('a', { perDay: 2, fixedStartsS: [at(1)] }),
      circuit('n', { type: 'none', perDay: 4 }),
    ];
    expect(check(fixed, freeRules(), { a: [at(1), at(13)] }).breaches).toEqual([]);
    expect(check(fixed, freeRules(), { a: [at(2)], n: [0], x: [0] }).breaches).toEqual([
      { rule: 'unknownCircuit', circuitIds: ['x'], atS: null, value: null, limit: null },
      { rule: 'startsPerDay', circuitIds: ['a'], atS: null, value: 1, limit: 2 },
      { rule: 'fixedStarts', circuitIds: ['a'], atS: at(1), value: at(1), limit: null },
      { rule: 'startsPerDay', circuitIds: ['n'], atS: null, value: 1, limit: 0 },
    ]);
    for (const startS of [-1, at(24), NaN, Infinity])
      expect(check([circuit('a')], freeRules(), { a: [startS] }).breaches[0]?.rule).toBe('startOutsideDay');
  });
});

describe('checkDefrostPlan, figures that nothing can be checked with', () => {
  it.each<[Partial<DefrostCircuit>, keyof DefrostCircuit]>([
    [{ perDay: 1.5 }, 'perDay'],
    [{ perDay: -1 }, 'perDay'],
    [{ perDay: 25 }, 'perDay'],
    [{ durationS: NaN }, 'durationS'],
    [{ durationS: 0 }, 'durationS'],
    [{ dripS: -1 }, 'dripS'],
    [{ loadW: NaN }, 'loadW'],
    [{ heaterW: -1 }, 'heaterW'],
    [{ fixedStartsS: [at(24)] }, 'fixedStartsS'],
    [{ fixedStartsS: [0, at(12)] }, 'fixedStartsS'],
  ])('%j', (change, field) => {
    const result = checkDefrostPlan([circuit('a', change)], freeRules(), []);
    expect(result).toEqual({ ok: false, problems: [{ circuitId: 'a', field }] });
  });

  it.each<[Partial<DefrostRules>, keyof DefrostRules]>([
    [{ largestShareOfLoad: 0 }, 'largestShareOfLoad'],
    [{ largestShareOfLoad: 25 }, 'largestShareOfLoad'],
    [{ largestShareInHotGas: NaN }, 'largestShareInHotGas'],
    [{ leastRunningLoadForHotGasW: NaN }, 'leastRunningLoadForHotGasW'],
    [{ leastRunningShareForHotGas: 1.1 }, 'leastRunningShareForHotGas'],
    [{ leastGapBetweenStartsS: -1 }, 'leastGapBetweenStartsS'],
    [{ quietHours: [{ fromS: 0, toS: 86_401 }] }, 'quietHours'],
    [{ largestHeaterDemandW: NaN }, 'largestHeaterDemandW'],
    [{ stepS: 60 }, 'stepS'],
    [{ stepS: 7000 }, 'stepS'],
  ])('%j', (change, field) => {
    const result = checkDefrostPlan([circuit('a')], freeRules(change), []);
    expect(result).toEqual({ ok: false, problems: [{ circuitId: null, field }] });
  });

  it('a circuit given twice', () => {
    const result = checkDefrostPlan([circuit('a'), circuit('a')], freeRules(), []);
    expect(result).toEqual({ ok: false, problems: [{ circuitId: 'a', field: 'id' }] });
  });
});
