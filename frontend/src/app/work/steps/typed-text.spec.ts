import { describe, expect, it } from '@jest/globals';
import { turnSign, typedOrNull } from './typed-text';

describe('turnSign', () => {
  it.each([
    ['12', '\u221212'],
    ['\u221212', '12'],
    ['-4.5', '4.5'],
    ['', '\u2212'],
    ['\u2212', ''],
  ])('turns %p into %p', (before, after) => {
    expect(turnSign(before)).toBe(after);
  });
});

describe('typedOrNull', () => {
  it('keeps the text as it was typed', () => {
    expect(typedOrNull(' 20,9 ', 'degF')).toEqual({ text: '20,9', unit: 'degF' });
  });

  it.each(['', '  ', '-', '\u2212'])('is null for %p', (text) => {
    expect(typedOrNull(text, 'degF')).toBeNull();
  });
});
