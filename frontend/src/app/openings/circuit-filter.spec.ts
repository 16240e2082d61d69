import { describe, expect, it } from '@jest/globals';
import type { CircuitRow } from '#shared/contracts/openings';
import { areasOf, filterCircuits, NOBODY, type CircuitFilter } from './circuit-filter';

const row = (code: string, change: Partial<Record<keyof CircuitRow, unknown>> = {}): CircuitRow =>
  ({
    code,
    description: 'Dairy',
    area: 'Sales floor',
    systemName: 'Rack A',
    suctionGroupName: 'A-MT',
    state: 'open',
    assigneeId: null,
    assigneeName: null,
    ...change,
  }) as unknown as CircuitRow;

const rows = [
  row('A1', { description: 'Panadería' }),
  row('A2', { area: 'Back room', state: 'submitted', assigneeId: 'p1', assigneeName: 'Ana Ruiz' }),
  row('B1', { systemName: 'Rack B', state: 'submitted' }),
];
const none: CircuitFilter = { text: '', area: '', state: '', assignee: '' };
const codes = (filter: Partial<CircuitFilter>): string[] =>
  filterCircuits(rows, { ...none, ...filter }).map(({ code }) => code);

describe('filterCircuits', () => {
  it.each([
    [{}, ['A1', 'A2', 'B1']],
    [{ text: 'panaderia' }, ['A1']],
    [{ text: 'rack ruiz' }, ['A2']],
    [{ area: 'Back room' }, ['A2']],
    [{ state: 'submitted' }, ['A2', 'B1']],
    [{ assignee: NOBODY, state: 'submitted' }, ['B1']],
    [{ assignee: 'p1' }, ['A2']],
    [{ text: 'zzz' }, []],
  ])('lets %j through to %j', (filter, expected) => {
    expect(codes(filter)).toEqual(expected);
  });
});

describe('areasOf', () => {
  it('names each area once, in order', () => {
    expect(areasOf(rows)).toEqual(['Back room', 'Sales floor']);
  });
});
