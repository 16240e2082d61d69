import { describe, expect, it } from '@jest/globals';
import { drawCurve, HEIGHT, WIDTH, type Scale } from './curve-drawing';
import { readSheet, type SheetFigures } from './sheet-reading';
import { sheetText } from './sheet.fixture';

const US = { temperature: 'degF', pressure: 'psig' } as const;
const NAMES = { designation: 'R-9X1', issuer: 'Example Gases', edition: '1' };
const sheet = readSheet(sheetText(), US, NAMES) as SheetFigures;
const draw = (scale: Scale, table = sheet.saturation) =>
  drawCurve(sheet.table.points, table, US, scale, new Set([3]));

describe.each(['logarithmic', 'linear'] as const)('drawCurve, %s', (scale) => {
  const drawing = draw(scale);

  it('has a dot for each row, from the left edge to the right one, dew below bubble', () => {
    expect(drawing?.dots).toHaveLength(10);
    expect(drawing?.dots[0]?.x).toBeCloseTo(drawing?.frame.left ?? NaN, 6);
    expect(drawing?.dots.at(-1)?.x).toBeCloseTo(drawing?.frame.right ?? NaN, 6);
    for (const { bubbleY, dewY } of drawing?.dots ?? []) expect(dewY).toBeGreaterThan(bubbleY);
  });

  it('stays inside its frame and never turns back', () => {
    const ys = [...(drawing?.dew ?? '').matchAll(/[ML]([\d.]+) ([\d.]+)/g)].map(([, , y]) => Number(y));
    // 90 K in steps of at most 1 K, where the rows alone would be ten.
    expect(ys.length).toBeGreaterThanOrEqual(91);
    ys.slice(1).forEach((y, index) => expect(y).toBeLessThanOrEqual(ys[index] ?? NaN));
    const ticks = [...(drawing?.temperatures ?? []), ...(drawing?.pressures ?? [])].map(({ at }) => at);
    for (const at of [...ys, ...ticks]) {
      expect(at).toBeGreaterThanOrEqual(0);
      expect(at).toBeLessThanOrEqual(Math.max(WIDTH, HEIGHT));
    }
  });

  it('marks the rows that something is said about', () => {
    expect(drawing?.dots.filter(({ isNamed }) => isNamed)).toEqual([drawing?.dots[2]]);
  });

  it('has round figures at its axes', () => {
    expect(drawing?.temperatures.map(({ text }) => text)).toEqual([
      '\u221240',
      '\u221220',
      '0',
      '20',
      '40',
      '60',
      '80',
      '100',
      '120',
    ]);
    expect(drawing?.pressures.length).toBeGreaterThan(2);
  });
});

describe('drawCurve', () => {
  it('draws a vapour-pressure curve nearly straight on the logarithmic scale, and bent on the linear one', () => {
    const middle = (scale: Scale): number => {
      const dots = draw(scale)?.dots ?? [];
      const [first, last] = [dots[0]?.dewY ?? NaN, dots.at(-1)?.dewY ?? NaN];
      return ((dots[5]?.dewY ?? NaN) - first) / (last - first);
    };
    expect(middle('logarithmic')).toBeGreaterThan(0.55);
    expect(middle('linear')).toBeLessThan(0.45);
  });

  it('goes from row to row while something is refused', () => {
    expect([...(draw('linear', null)?.dew ?? '').matchAll(/L/g)]).toHaveLength(9);
  });

  it('has nothing to draw of one row, or of rows without pressures', () => {
    const [one] = sheet.table.points;
    if (!one) throw new Error('no rows');
    expect(drawCurve([one], null, US, 'linear', new Set())).toBeNull();
    expect(
      drawCurve(
        [
          { ...one, dewPa: -1 },
          { ...one, bubblePa: NaN },
        ],
        null,
        US,
        'linear',
        new Set(),
      ),
    ).toBeNull();
  });
});
