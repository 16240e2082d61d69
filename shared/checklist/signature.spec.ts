import { describe, expect, it } from '@jest/globals';
import { isSigned, signaturePath, signatureSchema } from './signature';
import { buildSignature } from './step.fixture';

describe('isSigned', () => {
  it('takes one line for a signature, a tap for none', () => {
    expect(isSigned(buildSignature({ strokes: [[1, 2, 3, 4]] }))).toBe(true);
    expect(isSigned(buildSignature({ strokes: [[1, 2]] }))).toBe(false);
    expect(isSigned(buildSignature({ strokes: [[], []] }))).toBe(false);
  });

  it('takes a typed name for a signature', () => {
    expect(isSigned(buildSignature({ strokes: [], typed: true }))).toBe(true);
  });
});

describe('signaturePath', () => {
  it('draws a move and lines for each stroke', () => {
    const strokes = [
      [1, 2, 3, 4, 5, 6],
      [7, 8, 9, 10],
    ];
    expect(signaturePath(buildSignature({ strokes }))).toBe('M1 2L3 4L5 6M7 8L9 10');
  });

  it('draws a dot as a line too short to see the length of', () => {
    expect(signaturePath(buildSignature({ strokes: [[5, 6]] }))).toBe('M5 6l0.1 0');
  });

  it('leaves out a coordinate without its partner, and empty strokes', () => {
    expect(signaturePath(buildSignature({ strokes: [[], [1], [1, 2, 3, 4, 5]] }))).toBe('M1 2L3 4');
  });

  it('is empty for a typed signature', () => {
    expect(signaturePath(buildSignature({ strokes: [], typed: true }))).toBe('');
  });

  it('does not change the strokes', () => {
    const signature = buildSignature({ strokes: [[1, 2, 3, 4, 5]] });
    const before = structuredClone(signature);
    signaturePath(signature);
    expect(signature).toEqual(before);
  });
});

describe('signatureSchema', () => {
  it.each([
    ['no printed name', { printedName: '' }],
    ['a point far outside the box', { strokes: [[9000, 1]] }],
    ['more strokes than anybody draws', { strokes: Array.from({ length: 201 }, () => [1, 2, 3, 4]) }],
    ['a stroke that would fill a book', { strokes: [Array.from({ length: 4001 }, () => 1)] }],
    ['coordinates that are no numbers', { strokes: [[Number.NaN, 1]] }],
  ])('refuses %s', (_name, change) => {
    expect(signatureSchema.safeParse(buildSignature(change)).success).toBe(false);
  });
});
