import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { parseNumber } from '../../units/parse-number';
import { cellNumber } from './cell-number';

describe('cellNumber', () => {
  it.each([
    ['55.2', false, 55.2],
    [' -3,5 ', true, -3.5],
    ['+4', 'auto', 4],
    ['.5', 'auto', 0.5],
    ['-0', 'auto', 0],
    ['−3.5', 'auto', -3.5],
    ['1.2E-3', false, 0.0012],
    ['1,2e+2', true, 120],
    ['1,234.5', 'auto', 1234.5],
    ['1,234', 'auto', 'ambiguous'],
    ['', 'auto', 'empty'],
    ['   ', 'auto', 'empty'],
    ['OL', 'auto', 'unreadable'],
    ['---', 'auto', 'unreadable'],
    ['NaN', 'auto', 'unreadable'],
    ['Infinity', 'auto', 'unreadable'],
    ['1e999', 'auto', 'unreadable'],
    ['0x10', 'auto', 'unreadable'],
    ['1.2.3', 'auto', 'unreadable'],
    ['28 °F', 'auto', 'unreadable'],
  ] as const)('reads %j (decimal comma %s) as %s', (text, decimalComma, expected) => {
    expect(cellNumber(text, decimalComma)).toBe(expected);
  });

  it('agrees with parseNumber wherever that reads a number', () => {
    const text = fc.string({ unit: fc.constantFrom(...'0123456789.,-+ '), maxLength: 9 });
    fc.assert(
      fc.property(text, fc.constantFrom('auto' as const, true, false), (typed, decimalComma) => {
        const parsed = parseNumber(typed, { decimalComma });
        const ours = cellNumber(typed, decimalComma);
        expect(typeof ours === 'number' ? ours : undefined).toBe(parsed.ok ? parsed.value : undefined);
      }),
      { numRuns: 2000 },
    );
  });
});
