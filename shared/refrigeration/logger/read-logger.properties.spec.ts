import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { fromSi } from '../../units/convert';
import type { LoggerFile } from './logger-file';
import { valuesIn } from './pick-column';
import { readLogger } from './read-logger';

function file(lines: readonly string[]): LoggerFile {
  const result = readLogger(lines.join('\n'));
  if (!result.ok) throw new Error(result.reason);
  return result;
}

const samples = fc.uniqueArray(
  fc.record({ at: fc.integer({ min: 0, max: 100_000 }), pa: fc.integer({ min: -50_000, max: 900_000 }) }),
  { minLength: 2, maxLength: 40, selector: ({ at }) => at },
);

const pascals = (read: LoggerFile): number[] => {
  const column = read.columns[0];
  if (column === undefined || column.unit === null) throw new Error('no unit');
  return [...valuesIn(column, column.unit, 'Pag')];
};

describe('readLogger', () => {
  it('does not depend on the units, the marks or where the clock began', () => {
    fc.assert(
      fc.property(samples, fc.integer({ min: 0, max: 1_000_000 }), (rows, shift) => {
        const us = file([
          'Time (s),Pressure (psig)',
          ...rows.map(({ at, pa }) => `${at},${fromSi(pa, 'psig').toFixed(9)}`),
        ]);
        const si = file([
          'Tiempo (min);Presión [bar]',
          ...rows.map(({ at, pa }) =>
            `${(at + shift) / 60};${fromSi(pa, 'barg').toFixed(9)}`.replaceAll('.', ','),
          ),
        ]);
        expect(us.rows).toBe(rows.length);
        expect(si.rows).toBe(rows.length);
        us.times.forEach((time, index) => expect(si.times[index]).toBeCloseTo(time, 4));
        pascals(us).forEach((value, index) => expect(pascals(si)[index]).toBeCloseTo(value, 2));
      }),
      { numRuns: 50 },
    );
  });

  it('does not depend on the order of the rows, nor on how the text is cut', () => {
    fc.assert(
      fc.property(samples, fc.integer({ min: 1, max: 50 }), (rows, size) => {
        const line = ({ at, pa }: { at: number; pa: number }) => `${at}\t${pa}`;
        const sorted = file(['Time (s)\tP (Pag)', ...[...rows].sort((a, b) => a.at - b.at).map(line)]);
        const text = ['Time (s)\tP (Pag)', ...rows.map(line)].join('\r\n');
        const pieces = text.match(new RegExp(`[^]{1,${size}}`, 'g')) ?? [];
        const shuffled = readLogger(pieces);
        if (!shuffled.ok) throw new Error(shuffled.reason);
        expect(shuffled.times).toEqual(sorted.times);
        expect(shuffled.columns).toEqual(sorted.columns);
        expect(shuffled.startText).toBe(sorted.startText);
      }),
      { numRuns: 50 },
    );
  });

  it('never throws, and its times ascend', () => {
    const cell = fc.constantFrom(
      '0',
      '1,5',
      '"',
      '2026-01-05 10:00',
      '05/06/2026 1:00 PM',
      'x',
      '',
      '10:00',
      '-3.2',
    );
    const line = fc
      .tuple(fc.array(cell, { maxLength: 4 }), fc.constantFrom(',', ';', '\t', '|'))
      .map(([cells, delimiter]) => cells.join(delimiter));
    fc.assert(
      fc.property(fc.array(line, { maxLength: 12 }), (lines) => {
        const result = readLogger(lines.join('\n'));
        if (!result.ok) return;
        expect(result.times[0]).toBe(0);
        result.times
          .slice(1)
          .forEach((time, index) => expect(time).toBeGreaterThan(result.times[index] ?? NaN));
        for (const { values } of result.columns) expect(values).toHaveLength(result.rows);
      }),
    );
  });
});
