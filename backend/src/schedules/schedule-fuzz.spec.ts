import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { scheduleProblemSchema } from '#shared/contracts/schedules';
import { parseSchedule } from './schedule-parser';
import { bytesOf, csvOf, fixturesOf, line } from './schedule-csv.fixture';

const HEADINGS = [
  ...Object.keys(line()),
  ...[
    'SST',
    'Load (MBH)',
    'Defrost',
    'Defrosts per day',
    'Length (ft)',
    'Coils',
    'Fixture type',
    'Circuit description',
  ],
];
const CELLS = [
  '',
  '-',
  '6',
  '20',
  '-20',
  '1,234',
  '20 °F',
  `8'-6"`,
  'A1',
  'LT',
  'medium',
  'R-448A',
  'none',
  '=1+1',
  '"',
  '__proto__',
];

const cell = fc.oneof(fc.constantFrom(...CELLS), fc.string({ unit: 'binary', maxLength: 12 }));
const scheduleLine = fc.dictionary(fc.constantFrom(...HEADINGS), cell).map((changes) => line({ ...changes }));

function check(bytes: Uint8Array, lines?: number): void {
  const reading = parseSchedule(bytes);
  if (reading.ok) {
    expect(fixturesOf(reading.schedule).length).toBe(lines ?? fixturesOf(reading.schedule).length);
    expect(JSON.stringify(reading.schedule)).not.toMatch(/NaN|Infinity/);
    return;
  }
  expect(reading.problems.length).toBeGreaterThan(0);
  expect(reading.problems.length).toBeLessThanOrEqual(201);
  for (const problem of reading.problems) {
    expect(scheduleProblemSchema.safeParse(problem).success).toBe(true);
    expect(problem.row).toBeGreaterThanOrEqual(1);
    expect(problem.message).toMatch(/\.$/);
    expect(problem.message).not.toMatch(/undefined|NaN|\[object/);
  }
}

describe('parseSchedule, given anything', () => {
  it('never throws for any bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (bytes) => check(bytes)),
      { numRuns: 500 },
    );
  });

  it('never throws for any bytes below good headings', () => {
    const head = bytesOf(csvOf([line()]));
    const property = fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) =>
      check(Uint8Array.from([...head, ...bytes])),
    );
    fc.assert(property, { numRuns: 500 });
  });

  it('either reads each line as one fixture or names problems, for any cells', () => {
    const property = fc.property(fc.array(scheduleLine, { minLength: 1, maxLength: 8 }), (lines) => {
      const all = lines.map((given) => ({
        ...Object.fromEntries(HEADINGS.map((heading) => [heading, ''])),
        ...given,
      }));
      check(bytesOf(csvOf(all)), all.length);
    });
    fc.assert(property, { numRuns: 500 });
  });
});
