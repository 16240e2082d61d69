import { describe, expect, it } from '@jest/globals';
import { stripScale } from './strip-scale';

const bare = { low: null, high: null, hunting: null, asFound: null };

describe('stripScale', () => {
  it('has every figure inside with air around it', () => {
    const scale = stripScale({ value: 7, low: 6, high: 10, hunting: { low: 4, high: 9 }, asFound: 20 });
    expect(scale.from).toBeLessThan(4);
    expect(scale.to).toBeGreaterThan(20);
  });
  it('has a width when value and limit are the same', () => {
    const scale = stripScale({ ...bare, value: 0, high: 0 });
    expect(scale.to).toBeGreaterThan(scale.from);
  });
  it('sets few ticks at round steps', () => {
    const { ticks } = stripScale({ ...bare, value: 7, low: 6, high: 10 });
    expect(ticks.length).toBeGreaterThan(3);
    expect(ticks.length).toBeLessThan(12);
    expect(ticks.every((tick) => Math.abs(tick * 2 - Math.round(tick * 2)) < 1e-9)).toBe(true);
  });
});
