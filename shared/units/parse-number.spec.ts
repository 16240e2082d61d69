import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { parseNumber } from './parse-number';

describe('parseNumber', () => {
  it.each([
    ['20.9', 20.9],
    ['20,9', 20.9],
    ['-4', -4],
    ['\u22124', -4],
    ['\u20134', -4],
    ['- 4', -4],
    [' 12 ', 12],
    ['\u00a012\u202f', 12],
    ['+3', 3],
    ['5.', 5],
    ['.5', 0.5],
    [',5', 0.5],
    ['007', 7],
    ['1,234.5', 1234.5],
    ['1.234,5', 1234.5],
    ['1,234,567', 1234567],
    ['1.234.567', 1234567],
    ['0,125', 0.125],
    ['1234,567', 1234.567],
    ['1.234', 1.234],
    ['1,23', 1.23],
  ])('reads %j as %d', (text, value) => {
    expect(parseNumber(text)).toEqual({ ok: true, value });
  });

  it('reads minus nothing as a plain zero', () => {
    const parsed = parseNumber('-0');
    expect(parsed.ok && Object.is(parsed.value, 0)).toBe(true);
  });

  it.each(['', '   ', '\u00a0'])('calls %j empty', (text) => {
    expect(parseNumber(text)).toEqual({ ok: false, reason: 'empty' });
  });

  it.each([
    ...['1e3', '0x10', 'NaN', 'Infinity', '-', '+', '.', ',', '--4', '+-4', '20.9 °F', '1 234', 'abc', '12a'],
    ...['1,23.4', '1.2.3', '12,34,567', '1,234.5,6', '1,2345,678', '1.234,567.8', '٣'],
  ])('calls %j no number', (text) => {
    expect(parseNumber(text)).toEqual({ ok: false, reason: 'notANumber' });
  });

  it('calls one comma before three digits ambiguous', () => {
    expect(parseNumber('1,234')).toEqual({ ok: false, reason: 'ambiguous' });
    expect(parseNumber('-123,456')).toEqual({ ok: false, reason: 'ambiguous' });
  });

  it('takes the reader’s habit for the ambiguous form only', () => {
    expect(parseNumber('1,234', { decimalComma: true })).toEqual({ ok: true, value: 1.234 });
    expect(parseNumber('1,234', { decimalComma: false })).toEqual({ ok: true, value: 1234 });
    expect(parseNumber('1.234', { decimalComma: true })).toEqual({ ok: true, value: 1234 });
    expect(parseNumber('1.234', { decimalComma: false })).toEqual({ ok: true, value: 1.234 });
    expect(parseNumber('20.9', { decimalComma: true })).toEqual({ ok: true, value: 20.9 });
    expect(parseNumber('20,9', { decimalComma: false })).toEqual({ ok: true, value: 20.9 });
  });

  it('calls a number beyond all bounds not finite', () => {
    expect(parseNumber('9'.repeat(400))).toEqual({ ok: false, reason: 'notFinite' });
  });

  it('reads every plain decimal as the language itself does', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -99999, max: 99999 }),
        fc.integer({ min: 0, max: 99 }),
        (whole, hundredths) => {
          const text = `${whole}.${String(hundredths).padStart(2, '0')}`;
          const expected = Number(text) === 0 ? 0 : Number(text);
          expect(parseNumber(text)).toEqual({ ok: true, value: expected });
          expect(parseNumber(text.replace('.', ','))).toEqual({ ok: true, value: expected });
        },
      ),
    );
  });

  it('never throws and never gives a number for text without digits', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const parsed = parseNumber(text);
        expect(parsed.ok && !/\d/.test(text)).toBe(false);
        expect(!parsed.ok || Number.isFinite(parsed.value)).toBe(true);
      }),
    );
  });
});
