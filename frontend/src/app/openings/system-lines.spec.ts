import { describe, expect, it } from '@jest/globals';
import type { OpeningDetail } from '#shared/contracts/openings';
import { systemLines } from './system-lines';

describe('systemLines', () => {
  it('keeps joints and circuits in step and counts what is approved', () => {
    const systems = [
      {
        id: 's1',
        name: 'Rack A',
        refrigerant: 'R-448A',
        joints: [
          { circuitId: 'c1', code: 'A1', state: 'approved' },
          { circuitId: 'c2', code: 'A2', state: 'sentBack' },
          { circuitId: 'c3', code: 'A3', state: 'noSequence' },
        ],
        work: [
          { circuitId: 'w1', code: 'Rack A', state: 'approved', level: 'system' },
          { circuitId: 'w2', code: 'Rack A AS-1', state: 'underWay', level: 'suctionGroup' },
        ],
      },
    ] as unknown as OpeningDetail['systems'];
    expect(systemLines(systems)).toEqual([
      {
        id: 's1',
        name: 'Rack A',
        refrigerant: 'R-448A',
        joints: [
          { label: 'A1', state: 'approved' },
          { label: 'A2', state: 'sentBack' },
          { label: 'A3', state: 'noSequence' },
        ],
        circuitIds: ['c1', 'c2', 'c3'],
        approved: 1,
        total: 2,
        work: [
          { circuitId: 'w1', name: 'Rack A', state: 'approved', level: 'system' },
          { circuitId: 'w2', name: 'AS-1', state: 'underWay', level: 'suctionGroup' },
        ],
      },
    ]);
  });
});
