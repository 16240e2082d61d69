import { describe, expect, it } from '@jest/globals';
import { missingFigures, plannedCircuits, possibleBoxes } from './defrost-circuits';
import type { DefrostDetails, ScheduledDefrost } from './defrost-plans';

const scheduled = (id: string, change: Partial<ScheduledDefrost> = {}): ScheduledDefrost => ({
  id: id as ScheduledDefrost['id'],
  code: id.toUpperCase(),
  description: '',
  systemName: 'Rack A',
  groupId: 'g' as ScheduledDefrost['groupId'],
  groupName: 'AS-1',
  type: 'electric',
  perDay: 2,
  failSafeS: 1800,
  dripS: 300,
  loadW: 3000,
  walkIns: [],
  ...change,
});
const given = (id: string, change: Partial<DefrostDetails>): DefrostDetails => ({
  circuitId: id as DefrostDetails['circuitId'],
  durationS: null,
  dripS: null,
  loadW: null,
  heaterW: null,
  box: null,
  airCurtain: null,
  fixedStartsS: [],
  ...change,
});

describe('plannedCircuits', () => {
  it('takes what was given by hand before the schedule', () => {
    const [first, second] = plannedCircuits(
      [scheduled('a'), scheduled('b')],
      [given('b', { durationS: 2400, dripS: 0, box: 'Ice cream', fixedStartsS: [600] })],
    );
    expect(first).toMatchObject({ durationS: 1800, dripS: 300, box: null, fixedStartsS: [] });
    expect(second).toMatchObject({ durationS: 2400, dripS: 0, box: 'Ice cream', fixedStartsS: [600] });
  });
});

describe('missingFigures', () => {
  it('names the circuits that lack a figure, each for what it needs', () => {
    const circuits = [
      scheduled('a', { failSafeS: null, dripS: null, loadW: null }),
      scheduled('b', { type: 'offTime', dripS: null }),
      scheduled('c', { type: 'none', perDay: 0, failSafeS: null, dripS: null }),
    ];
    expect(missingFigures(circuits, [])).toEqual({
      duration: ['a'],
      drip: ['a'],
      load: ['a'],
      heater: ['a'],
    });
  });

  it('is content with what was given by hand', () => {
    const circuits = [scheduled('a', { failSafeS: null, dripS: null, loadW: null })];
    const details = [given('a', { durationS: 1800, dripS: 0, loadW: 0, heaterW: 4000 })];
    expect(missingFigures(circuits, details)).toEqual({ duration: [], drip: [], load: [], heater: [] });
  });
});

describe('possibleBoxes', () => {
  const circuits = [
    scheduled('a', { walkIns: ['Grocery freezer'] }),
    scheduled('b', { walkIns: ['grocery freezer '] }),
    scheduled('c', { walkIns: ['Meat freezer'] }),
  ];

  it('asks about walk-ins of the same name under several circuits', () => {
    expect(possibleBoxes(circuits, [])).toEqual([{ name: 'Grocery freezer', circuitIds: ['a', 'b'] }]);
  });

  it('asks no more once one of them has been named', () => {
    expect(possibleBoxes(circuits, [given('a', { box: 'Freezer 1' })])).toEqual([]);
  });
});
