import { describe, expect, it } from '@jest/globals';
import { groupCircuits, type WorkRow } from './circuit-groups';

const row = (code: string, area: string, state: WorkRow['state'] = 'open', opening = 'One'): WorkRow =>
  ({ code, area, state, openingId: opening, openingName: opening, unsentCount: 0 }) as unknown as WorkRow;
const codes = (rows: readonly WorkRow[]): string[] => rows.map(({ code }) => code);

describe('groupCircuits', () => {
  it('puts what was sent back first, whatever its area', () => {
    const [group] = groupCircuits([
      row('A1', 'Dairy'),
      row('B9', 'Produce', 'sentBack'),
      row('B2', 'Dairy', 'sentBack'),
    ]);
    expect(codes(group!.sentBack)).toEqual(['B2', 'B9']);
    expect(group!.areas.map(({ area }) => area)).toEqual(['Dairy']);
  });

  it('sorts codes as people count', () => {
    const [group] = groupCircuits([row('A10', 'Dairy'), row('A2', 'Dairy')]);
    expect(codes(group!.areas[0]!.rows)).toEqual(['A2', 'A10']);
  });

  it('keeps openings apart', () => {
    expect(groupCircuits([row('A1', 'Dairy'), row('A1', 'Dairy', 'open', 'Two')])).toHaveLength(2);
  });
});
