import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { toSi } from './convert';
import { formatNumber, formatQuantity } from './format';
import { parseNumber } from './parse-number';
import { roundTo } from './round';

describe('formatNumber', () => {
  it('writes all the decimals asked for', () => {
    expect(formatNumber(21, 1, 'en')).toBe('21.0');
  });

  it('writes a decimal point in Spanish too, as North America does', () => {
    expect(formatNumber(20.94, 1, 'es')).toBe('20.9');
  });

  it('writes a real minus sign', () => {
    expect(formatNumber(-3.25, 1, 'es')).toBe('\u22123.3');
  });

  it('writes no sign in front of what rounds to zero', () => {
    expect(formatNumber(-0.04, 1, 'en')).toBe('0.0');
  });

  it('writes no thousands separators', () => {
    expect(formatNumber(54330, 0, 'en')).toBe('54330');
  });

  it.each([NaN, Infinity, -Infinity])('writes a dash for %d', (value) => {
    expect(formatNumber(value, 1, 'en')).toBe('—');
  });

  it.each(['en', 'es'] as const)('writes what parseNumber reads back (%s)', (locale) => {
    fc.assert(
      fc.property(
        fc.double({ min: -9e5, max: 9e5, noNaN: true }),
        fc.integer({ min: 0, max: 3 }),
        (value, decimals) => {
          expect(parseNumber(formatNumber(value, decimals, locale))).toEqual({
            ok: true,
            value: roundTo(value, decimals),
          });
        },
      ),
    );
  });
});

describe('formatQuantity', () => {
  it.each([
    [toSi(20.94, 'degF'), 'degF', 'en', '20.9 °F'],
    [toSi(-3, 'degF_diff'), 'degF_diff', 'en', '−3.0 °F'],
    [toSi(45, 'psig'), 'psig', 'en', '45.0 psig'],
    [toSi(3.1, 'barg'), 'barg', 'es', '3.10 bar(g)'],
    [toSi(-1, 'psi_diff'), 'psi_diff', 'en', '−1.0 psi'],
    [toSi(0.07, 'bar_diff'), 'bar_diff', 'es', '0.070 bar'],
    [toSi(2, 'psi_diff'), 'kPa_diff', 'en', '13.8 kPa'],
    [toSi(500, 'micron'), 'Pa_vac', 'en', '66.7 Pa'],
    [toSi(500, 'micron'), 'micron', 'en', '500 µm Hg'],
    [toSi(9800, 'BTU_h'), 'BTU_h', 'en', '9800 BTU/h'],
    [0.0196, 'percent', 'en', '2.0 %'],
    [3, 'count', 'en', '3'],
  ] as const)('writes %d as %s for %s: %s', (siValue, unit, locale, expected) => {
    expect(formatQuantity(siValue, unit, locale)).toBe(expected);
  });
});
