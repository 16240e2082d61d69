import { describe, expect, it } from '@jest/globals';
import { drawStrip } from './strip-drawing';

const steady = { minimum: null, maximum: null };

describe('drawStrip', () => {
  it('puts a value in the middle of its limits in the middle of the channel', () => {
    const drawn = drawStrip({ low: 2, high: 6, value: 4, ...steady });
    expect(drawn.value).toBeCloseTo(((drawn.low ?? 0) + (drawn.high ?? 0)) / 2, 10);
    expect(drawn.way).toBeNull();
  });

  it('shows the way up to the low edge for a value below', () => {
    const drawn = drawStrip({ low: 3, high: 6, value: 1, ...steady });
    expect(drawn.way).toEqual({ from: drawn.value, to: drawn.low, direction: 'up' });
  });

  it('shows the way down to the high edge for a value above', () => {
    const drawn = drawStrip({ low: 3, high: 6, value: 9, ...steady });
    expect(drawn.way).toEqual({ from: drawn.value, to: drawn.high, direction: 'down' });
  });

  it('draws the instruments’ error around the value, on the bar', () => {
    const drawn = drawStrip({ low: 3, high: 6, value: 4, ...steady, uncertainty: 40 });
    expect((drawn.whisker!.from + drawn.whisker!.to) / 2).toBeCloseTo(drawn.value, 10);
    expect(drawn.whisker!.from).toBeGreaterThan(0);
    expect(drawn.whisker!.to).toBeLessThan(1);
  });

  it.each([null, 0, NaN, -1])('draws no error of %p', (uncertainty) => {
    expect(drawStrip({ low: 3, high: 6, value: 4, ...steady, uncertainty }).whisker).toBeNull();
  });

  it('shows no way for a value on the edge', () => {
    expect(drawStrip({ low: 278.15, high: null, value: 278.15 - 1e-10, ...steady }).way).toBeNull();
  });

  it('keeps everything on the bar, however far off', () => {
    const drawn = drawStrip({ low: 3, high: 6, value: 80, minimum: -20, maximum: 95 });
    for (const place of [
      drawn.value,
      drawn.low ?? 0,
      drawn.high ?? 0,
      drawn.bracket?.from ?? 0,
      drawn.bracket?.to ?? 0,
    ]) {
      expect(place).toBeGreaterThan(0);
      expect(place).toBeLessThan(1);
    }
    expect(drawn.isNarrow).toBe(true);
  });

  it('runs the channel to the end of the bar on the side without a limit', () => {
    const drawn = drawStrip({ low: null, high: 278, value: 276, ...steady });
    expect(drawn.channel?.from).toBe(0);
    expect(drawn.channel?.to).toBe(drawn.high);
  });

  it('has no channel and no way where nothing is wanted', () => {
    const drawn = drawStrip({ low: null, high: null, value: 0, ...steady });
    expect(drawn.channel).toBeNull();
    expect(drawn.way).toBeNull();
    expect(drawn.value).toBeCloseTo(0.5, 10);
  });
});
