import { describe, expect, it } from '@jest/globals';
import { drawTrend, type TrendDrawing } from './trend-drawing';

const GAP_S = 900;
function draw(atS: number[], temperatureK: number[], low: number | null = null): TrendDrawing {
  const drawing = drawTrend({ atS, temperatureK }, { lowK: low, highK: 278.15 }, 'degC', GAP_S);
  if (!drawing) throw new Error('nothing is drawn');
  return drawing;
}
const pieces = (path: string): number => path.split('M').length - 1;

describe('drawTrend', () => {
  it('draws from the left to the right edge, warm on top', () => {
    const { path, lowestK, highestK } = draw([100, 400, 700], [298.15, 288.15, 278.15]);
    const points = path
      .split(/[ML]/)
      .slice(1)
      .map((point) => point.split(' ').map(Number));
    expect(points.map(([x]) => x)).toEqual([0, 500, 1000]);
    expect(points[0]![1]).toBeLessThan(points[1]![1]!);
    // 20 K and 8 % of it at either end.
    expect(points[0]![1]).toBeCloseTo((1.6 / 23.2) * 1000, 1);
    expect([lowestK, highestK]).toEqual([278.15, 298.15]);
  });

  it('puts the band from its upper edge to the bottom, or to its lower edge', () => {
    const open = draw([0, 600], [288.15, 278.15]).band;
    expect(open).toMatchObject({ to: 1, hasLow: false });
    const closed = draw([0, 600], [288.15, 278.15], 274.15).band;
    expect(closed.hasLow).toBe(true);
    // 4 K of 14 K with 8 % margins.
    expect(closed.to - closed.from).toBeCloseTo(4 / (14 * 1.16), 6);
  });

  it('shows the band even where the log never comes near it', () => {
    const { band } = draw([0, 600], [300, 301]);
    expect(band.from).toBeGreaterThan(0);
    expect(band.from).toBeLessThan(1);
  });

  it('breaks the line where the log is silent, and nowhere else', () => {
    expect(pieces(draw([0, 900, 1800], [280, 279, 278]).path)).toBe(1);
    expect(pieces(draw([0, 900, 1801], [280, 279, 278]).path)).toBe(2);
  });

  it('draws a long log with fewer points, its peak among them, broken only where it is silent itself', () => {
    // 80 000 s without a gap, then half a day of silence, then as long again.
    const atS = Array.from({ length: 20_000 }, (_, index) => index * 8 + (index >= 10_000 ? 43_200 : 0));
    const temperatureK = atS.map((_, index) => (index === 7001 ? 290 : 275));
    const { path } = draw(atS, temperatureK);
    // The peak lies 8 % of 116 % below the top.
    expect(path.split(/[ML]/).length).toBeLessThan(1700);
    expect(pieces(path)).toBe(2);
    expect(path).toContain(' 69.0');
  });

  it('ticks whole hours and even degrees in the unit that is read', () => {
    const atS = Array.from({ length: 37 }, (_, index) => index * 3600);
    const { hours, degrees } = draw(
      atS,
      atS.map((_, index) => 298.15 - index / 2),
    );
    expect(hours.map(({ value }) => value)).toEqual([0, 6, 12, 18, 24, 30, 36]);
    expect(hours[3]!.at).toBeCloseTo(0.5, 9);
    expect(degrees.map(({ value }) => value)).toEqual([5, 10, 15, 20, 25]);
    expect(degrees[0]!.at).toBeGreaterThan(degrees[1]!.at);
  });

  it('draws nothing of a single sample or of times that stand still', () => {
    const band = { lowK: null, highK: 278.15 };
    expect(drawTrend({ atS: [0], temperatureK: [280] }, band, 'degC', GAP_S)).toBeNull();
    expect(drawTrend({ atS: [5, 5], temperatureK: [280, 281] }, band, 'degC', GAP_S)).toBeNull();
    expect(drawTrend({ atS: [], temperatureK: [] }, band, 'degC', GAP_S)).toBeNull();
  });
});
