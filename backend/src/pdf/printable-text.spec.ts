import { describe, expect, it } from '@jest/globals';
import { printableText } from './printable-text';

const hasLatin = (codePoint: number): boolean => codePoint < 0x250;
const print = (text: string): string => printableText(text, hasLatin, '#');

describe('printableText', () => {
  it('leaves text alone that the face can print', () =>
    expect(print('Élan at 4 °F\nnext')).toBe('Élan at 4 °F\nnext'));
  it('composes letters that were sent as letter and accent', () => expect(print('nin\u0303o')).toBe('niño'));
  it('puts one substitute for a whole emoji, whatever it is joined from', () => {
    expect(print('a👩🏽‍🔧b')).toBe('a#b');
    expect(print('🍎')).toBe('#');
  });
  it('drops marks that would turn the text around', () => expect(print('A\u202E21\u202C-B')).toBe('A21-B'));
  it('keeps line feeds and no other control character', () =>
    expect(print('a\r\nb\u0007c\td')).toBe('a\nbc d'));
  it('makes narrow and hard spaces plain', () => expect(print('2:14\u202fPM\u00a0CST')).toBe('2:14 PM CST'));
});
