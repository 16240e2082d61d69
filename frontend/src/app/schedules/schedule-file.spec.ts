import { describe, expect, it } from '@jest/globals';
import { fileFault, findProblems, MOST_BYTES, refusedRows } from './schedule-file';

describe('fileFault', () => {
  it.each([
    ['schedule.csv', 100, null],
    ['SCHEDULE.CSV', MOST_BYTES, null],
    ['schedule.csv', MOST_BYTES + 1, 'tooLarge'],
    ['schedule.csv', 0, 'empty'],
    ['schedule.pdf', 100, 'notCsv'],
  ])('finds %s of %i bytes: %p', (name, size, fault) => {
    expect(fileFault({ name, size })).toBe(fault);
  });
});

const problem = (facts: unknown) => ({
  status: 422,
  error: {
    type: 'about:blank',
    title: '',
    status: 422,
    detail: '',
    code: 'scheduleRefused',
    places: [],
    facts,
    requestId: 'r',
  },
});

describe('refusedRows', () => {
  it('reads the rows out of the refusal', () => {
    const reason = { code: 'notANumber', params: { text: 'x' } };
    const rows = [{ row: 7, column: 'Load', reason, message: 'It is not a number.' }];
    expect(refusedRows(problem({ rows }))).toEqual(rows);
  });

  it('is empty where the refusal names none', () => {
    expect(refusedRows(problem({}))).toEqual([]);
    expect(refusedRows(new Error('x'))).toEqual([]);
    expect(refusedRows(problem({ rows: [{ row: 7, column: 'Load', reason: 'words' }] }))).toEqual([]);
  });
});

describe('findProblems', () => {
  const rows = [
    { row: 7, column: 'Load', reason: 'is not a number' },
    { row: 12, column: null, reason: 'circuit A4 occurs twice' },
  ];

  it.each([
    ['', 2],
    ['load', 1],
    ['a4', 1],
    ['12', 1],
    ['zz', 0],
  ])('finds %p: %i', (text, count) => {
    expect(findProblems(rows, text)).toHaveLength(count);
  });
});
