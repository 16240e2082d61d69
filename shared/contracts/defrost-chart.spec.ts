import { describe, expect, it } from '@jest/globals';
import { checkDefrostPlan } from '../refrigeration/defrost/check-defrost-plan';
import { at, circuit, freeRules, MINUTE_S } from '../refrigeration/defrost/defrost.fixture';
import { barsOf, chartGroups, piecesOf, quietPieces, startKey, startsInBreach } from './defrost-chart';
import type { PlannedCircuit } from './defrost-plans';

const planned = (id: string, change: Partial<PlannedCircuit> = {}): PlannedCircuit =>
  ({ ...circuit(id), groupName: 'AS-1', fixedStartsS: [], ...change }) as PlannedCircuit;

describe('piecesOf', () => {
  it('cuts at midnight what passes it', () => {
    expect(piecesOf({ startS: at(23, 50), lengthS: 20 * MINUTE_S })).toEqual([
      { fromS: at(23, 50), toS: at(24) },
      { fromS: 0, toS: at(0, 10) },
    ]);
  });

  it('draws one piece up to midnight, nothing for nothing, and a day at most', () => {
    expect(piecesOf({ startS: at(23, 30), lengthS: at(0, 30) })).toEqual([
      { fromS: at(23, 30), toS: at(24) },
    ]);
    expect(piecesOf({ startS: 0, lengthS: 0 })).toEqual([]);
    expect(piecesOf({ startS: at(5), lengthS: at(24) })).toEqual([{ fromS: 0, toS: at(24) }]);
  });
});

describe('barsOf', () => {
  it('puts the drip after the defrost, past midnight too', () => {
    const drips = planned('a', { durationS: 20 * MINUTE_S, dripS: 10 * MINUTE_S });
    expect(barsOf(drips, [{ circuitId: 'a', startsS: [at(23, 40)] }])).toEqual([
      {
        startS: at(23, 40),
        defrost: [{ fromS: at(23, 40), toS: at(24) }],
        drip: [{ fromS: 0, toS: at(0, 10) }],
      },
    ]);
  });
});

describe('quietPieces', () => {
  it('wraps a night', () => {
    expect(quietPieces([{ fromS: at(22), toS: at(6) }])).toEqual([
      { fromS: at(22), toS: at(24) },
      { fromS: 0, toS: at(6) },
    ]);
  });
});

describe('chartGroups', () => {
  it('keeps the order of the circuits', () => {
    const groups = chartGroups([planned('a'), planned('b', { groupId: 'h' as never }), planned('c')]);
    expect(groups.map(({ circuits }) => circuits.map(({ id }) => id))).toEqual([['a', 'c'], ['b']]);
  });
});

describe('startsInBreach', () => {
  it('marks both starts of a gap and no other defrost of the two', () => {
    const circuits = [planned('a', { perDay: 2, durationS: MINUTE_S }), planned('b')];
    const plan = [
      { circuitId: 'a', startsS: [at(6), at(18)] },
      { circuitId: 'b', startsS: [at(6, 5)] },
    ];
    const check = checkDefrostPlan(circuits, freeRules({ leastGapBetweenStartsS: 15 * MINUTE_S }), plan);
    expect([...startsInBreach(check.ok ? check.breaches : [], circuits, plan)]).toEqual([
      startKey('a', at(6)),
      startKey('b', at(6, 5)),
    ]);
  });

  it('marks every start where a breach is about no moment', () => {
    const plan = [{ circuitId: 'a', startsS: [0, 600] }];
    const breach = { rule: 'startsPerDay', circuitIds: ['a'], atS: null, value: 2, limit: 1 } as const;
    expect(startsInBreach([breach], [planned('a')], plan).size).toBe(2);
  });
});
