import { describe, expect, it } from '@jest/globals';
import { concurrentLoad } from './concurrent-load';
import { at, circuit } from './defrost.fixture';

describe('concurrentLoad', () => {
  const circuits = [
    circuit('a', { loadW: 3000, type: 'electric', heaterW: 5000, dripS: 600 }),
    circuit('b', { loadW: 1000, type: 'electric', heaterW: 2000 }),
    circuit('c', { groupId: 'other', loadW: null, type: 'electric' }),
  ];
  const plan = [
    { circuitId: 'a', startsS: [at(23, 40)] },
    { circuitId: 'b', startsS: [at(0, 5)] },
    { circuitId: 'c', startsS: [at(12)] },
  ];

  it('adds up the shares of a group from midnight on, drip included', () => {
    expect(concurrentLoad(circuits, plan).groups[0]).toEqual({
      groupId: 'group',
      by: 'load',
      steps: [
        { fromS: 0, share: 0.75, circuitIds: ['a'] },
        { fromS: at(0, 5), share: 1, circuitIds: ['b', 'a'] },
        { fromS: at(0, 20), share: 0.25, circuitIds: ['b'] },
        { fromS: at(0, 35), share: 0, circuitIds: [] },
        { fromS: at(23, 40), share: 0.75, circuitIds: ['a'] },
      ],
      peakShare: 1,
      peakAtS: at(0, 5),
    });
  });

  it('adds up heaters of all groups without drip, and names those that nobody knows', () => {
    expect(concurrentLoad(circuits, plan).heaters).toEqual({
      steps: [
        { fromS: 0, demandW: 5000, unknownIds: [] },
        { fromS: at(0, 5), demandW: 7000, unknownIds: [] },
        { fromS: at(0, 10), demandW: 2000, unknownIds: [] },
        { fromS: at(0, 35), demandW: 0, unknownIds: [] },
        { fromS: at(12), demandW: 0, unknownIds: ['c'] },
        { fromS: at(12, 30), demandW: 0, unknownIds: [] },
        { fromS: at(23, 40), demandW: 5000, unknownIds: [] },
      ],
      peakW: 7000,
      peakAtS: at(0, 5),
    });
  });

  it('is flat where nothing defrosts, and by count where a load is missing', () => {
    const { groups, heaters } = concurrentLoad(circuits, []);
    expect(groups.map(({ by }) => by)).toEqual(['load', 'count']);
    expect(groups[1]?.steps).toEqual([{ fromS: 0, share: 0, circuitIds: [] }]);
    expect(heaters).toEqual({ steps: [{ fromS: 0, demandW: 0, unknownIds: [] }], peakW: 0, peakAtS: 0 });
  });
});
