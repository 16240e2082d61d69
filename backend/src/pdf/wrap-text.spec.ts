import { describe, expect, it } from '@jest/globals';
import { wrapText } from './wrap-text';

const wrap = (text: string, width: number): string[] => wrapText(text, width, (piece) => piece.length);

describe('wrapText', () => {
  it('breaks between words at the width', () =>
    expect(wrap('one two three', 7)).toEqual(['one two', 'three']));
  it('breaks a word that is wider than a line', () =>
    expect(wrap('abcdefgh ij', 3)).toEqual(['abc', 'def', 'gh', 'ij']));
  it('keeps line feeds and empty lines', () => expect(wrap('a\n\nb', 9)).toEqual(['a', '', 'b']));
  it('keeps a number with its unit', () =>
    expect(wrap('at most 24 °F, dew', 10)).toEqual(['at most', '24 °F, dew']));
  it('answers one empty line for no text', () => expect(wrap('', 9)).toEqual(['']));
  it('loses no letter of a long text', () => {
    const text = Array.from({ length: 400 }, (_, index) => `w${index}`).join(' ');
    expect(wrap(text, 31).join(' ')).toBe(text);
  });
});
