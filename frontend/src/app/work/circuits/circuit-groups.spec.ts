import { describe, expect, it } from '@jest/globals';
import { groupCircuits, type WorkRow } from './circuit-groups';

const row = (code: string, area: string, state: WorkRow['state'] = 'open', opening = 'One'): WorkRow =>
  ({
    level: 'circuit',
    code,
    area,
    state,
    openingId: opening,
    openingName: opening,
    unsentCount: 0,
  }) as unknown as WorkRow;
const codes = (rows: readonly WorkRow[]): string[] => rows.map(({ code }) => code);

describe('groupCircuits', () => {
  it('puts what was sent back first, whatever its opening and area', () => {
    const day = groupCircuits([
      row('A1', 'Dairy'),
      row('B9', 'Produce', 'sentBack'),
      row('B2', 'Dairy', 'sentBack', 'Two'),
      row('B1', 'Dairy', 'sentBack'),
    ]);
    expect(codes(day.sentBack)).toEqual(['B1', 'B9', 'B2']);
    expect(day.openings.flatMap(({ areas }) => areas.map(({ area }) => area))).toEqual(['Dairy']);
  });

  it('puts what is approved at the end, out of its area', () => {
    const day = groupCircuits([row('A1', 'Dairy', 'approved'), row('A2', 'Dairy', 'submitted')]);
    expect(codes(day.done)).toEqual(['A1']);
    expect(codes(day.openings[0]!.areas[0]!.rows)).toEqual(['A2']);
  });

  it('sorts codes as people count', () => {
    const { openings } = groupCircuits([row('A10', 'Dairy'), row('A2', 'Dairy')]);
    expect(codes(openings[0]!.areas[0]!.rows)).toEqual(['A2', 'A10']);
  });

  it('puts the work of systems and groups before the areas, and what was sent back of it first of all', () => {
    const levelRow = (code: string, level: WorkRow['level'], state: WorkRow['state'] = 'open') => ({
      ...row(code, '', state),
      level,
    });
    const day = groupCircuits([
      row('A1', 'Dairy'),
      levelRow('Rack B', 'system'),
      levelRow('Rack A AS-1', 'suctionGroup'),
      levelRow('Rack A', 'system'),
      levelRow('Rack A AS-2', 'suctionGroup', 'sentBack'),
    ]);
    expect(codes(day.openings[0]!.levels)).toEqual(['Rack A', 'Rack A AS-1', 'Rack B']);
    expect(day.openings[0]!.areas.map(({ area }) => area)).toEqual(['Dairy']);
    expect(codes(day.sentBack)).toEqual(['Rack A AS-2']);
  });

  it('keeps openings apart', () => {
    expect(groupCircuits([row('A1', 'Dairy'), row('A1', 'Dairy', 'open', 'Two')]).openings).toHaveLength(2);
  });
});
