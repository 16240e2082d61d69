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
      },
    ]);
  });
});
