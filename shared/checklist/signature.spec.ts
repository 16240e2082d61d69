import { describe, expect, it } from '@jest/globals';
import { isSigned, isSignedBy, signaturePath, signatureSchema } from './signature';
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

describe('isSignedBy', () => {
  const typed = (printedName: string) => buildSignature({ strokes: [], typed: true, printedName });

  it.each(['Renée Quill', 'renée  quill ', 'Rene\u0301e Quill'])(
    'takes the typed name %j for Renée Quill’s',
    (name) => {
      expect(isSignedBy(typed(name), 'Renée Quill')).toBe(true);
    },
  );

  it.each(['R. Quill', 'Renée', 'Renée Quill Jr', ''])('takes the typed name %j for nobody’s', (name) => {
    expect(isSignedBy(typed(name), 'Renée Quill')).toBe(false);
  });

  it('takes what was drawn for theirs whose hand it was, and an empty box for nobody’s', () => {
    expect(isSignedBy(buildSignature(), 'Renée Quill')).toBe(true);
    expect(isSignedBy(buildSignature({ strokes: [] }), 'R. Quill')).toBe(false);
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
