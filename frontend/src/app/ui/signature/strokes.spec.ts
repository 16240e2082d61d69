import { describe, expect, it } from '@jest/globals';
import { signatureSchema } from '#shared/checklist/signature';
import { isSameName, toPoints, toStrokes } from './strokes';

describe('toStrokes', () => {
  it('rounds to whole pixels and drops points that fall together', () => {
    const points = [
      { x: 1.2, y: 2.4 },
      { x: 1.4, y: 2.3 },
      { x: 5.6, y: 7.5 },
    ];
    expect(toStrokes([{ points }])).toEqual([[1, 2, 6, 8]]);
  });

  it('stays within what the contract takes, however long somebody draws', () => {
    const points = Array.from({ length: 9000 }, (_, index) => ({ x: index % 600, y: index % 97 }));
    const strokes = toStrokes(Array.from({ length: 300 }, () => ({ points })));
    const signature = { printedName: 'Ana Ruiz', width: 600, height: 160, strokes, typed: false };
    expect(signatureSchema.safeParse(signature).success).toBe(true);
  });
});

describe('toPoints', () => {
  it('gives back what was stored', () => {
    const signature = { printedName: 'A', width: 10, height: 10, strokes: [[1, 2, 6, 8]], typed: false };
    expect(toPoints(signature)).toEqual([
      [
        { x: 1, y: 2 },
        { x: 6, y: 8 },
      ],
    ]);
  });
});

describe('isSameName', () => {
  it.each([
    ['jose  garcia', 'José García', true],
    [' JOSÉ GARCÍA ', 'José García', true],
    ['Jose', 'José García', false],
    ['', '', false],
  ])('takes %p for %p: %p', (typed, printed, same) => {
    expect(isSameName(typed, printed)).toBe(same);
  });
});
