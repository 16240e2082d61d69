import { describe, expect, it } from '@jest/globals';
import { looksLikeImage, shrunkSize } from './photo-size';

const bytes = (text: string): Uint8Array => Uint8Array.from(text, (letter) => letter.charCodeAt(0));

describe('shrunkSize', () => {
  it('brings the longest side to 2048 pixels, in proportion', () => {
    expect(shrunkSize(4032, 3024)).toEqual({ width: 2048, height: 1536 });
    expect(shrunkSize(3024, 4032)).toEqual({ width: 1536, height: 2048 });
  });

  it('leaves a smaller photo as it is', () => {
    expect(shrunkSize(800, 600)).toEqual({ width: 800, height: 600 });
  });

  it('never comes to nothing', () => {
    expect(shrunkSize(100_000, 3)).toEqual({ width: 2048, height: 1 });
  });
});

describe('looksLikeImage', () => {
  it.each([
    ['JPEG', bytes('\u00ff\u00d8\u00ff\u00e0')],
    ['PNG', bytes('\u0089PNG\r\n')],
    ['WebP', bytes('RIFF....WEBP')],
    ['HEIC', bytes('....ftypheic')],
  ])('takes %s', (_name, head) => {
    expect(looksLikeImage(head)).toBe(true);
  });

  it.each([
    ['a PDF', bytes('%PDF-1.7')],
    ['a film', bytes('....ftypmp42')],
    ['nothing', bytes('')],
  ])('refuses %s', (_name, head) => {
    expect(looksLikeImage(head)).toBe(false);
  });
});
