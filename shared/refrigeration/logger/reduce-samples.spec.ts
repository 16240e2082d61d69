import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { reduceSamples } from './reduce-samples';

const log = fc
  .uniqueArray(
    fc.record({
      at: fc.integer({ min: -10_000, max: 10_000 }),
      value: fc.double({ min: -50, max: 50, noNaN: true }),
    }),
    { minLength: 2, maxLength: 200, selector: ({ at }) => at },
  )
  .map((points) => points.sort((a, b) => a.at - b.at))
  .map((points) => ({
    times: Float64Array.from(points, ({ at }) => at),
    values: Float64Array.from(points, ({ value }) => value),
  }));

describe('reduceSamples', () => {
  it('keeps the ends, the extremes and the order, and invents nothing', () => {
    fc.assert(
      fc.property(log, fc.integer({ min: 4, max: 60 }), ({ times, values }, most) => {
        const reduced = reduceSamples(times, values, most);
        expect(reduced.times.length).toBeLessThanOrEqual(Math.max(most, 2));
        expect(reduced.values).toHaveLength(reduced.times.length);
        expect([reduced.times[0], reduced.times.at(-1)]).toEqual([times[0], times.at(-1)]);
        expect(Math.min(...reduced.values)).toBe(Math.min(...values));
        expect(Math.max(...reduced.values)).toBe(Math.max(...values));
        reduced.times.forEach((time, index) => {
          if (index > 0) expect(time).toBeGreaterThan(reduced.times[index - 1] ?? NaN);
          expect(values[times.indexOf(time)]).toBe(reduced.values[index]);
        });
      }),
    );
  });

  it('keeps both extremes of each span, in the order of time', () => {
    const times = Float64Array.from({ length: 12 }, (_, index) => index);
    const values = Float64Array.of(0, 1, 9, 2, -3, 2, 1, 4, -7, 3, 8, 0);
    const reduced = reduceSamples(times, values, 6);
    expect([...reduced.times]).toEqual([0, 2, 4, 8, 10, 11]);
    expect([...reduced.values]).toEqual([0, 9, -3, -7, 8, 0]);
  });

  it('leaves short logs as they are, in a copy', () => {
    const times = Float64Array.of(0, 1, 2);
    const reduced = reduceSamples(times, Float64Array.of(5, NaN, 7), 3);
    expect([...reduced.values]).toEqual([5, NaN, 7]);
    reduced.times[0] = 9;
    expect(times[0]).toBe(0);
  });

  it('leaves out what is no number, and keeps only the ends where there is room for no more', () => {
    const times = Float64Array.of(0, 1, 2, 3, 4, 5);
    const values = Float64Array.of(1, NaN, NaN, 9, NaN, 2);
    expect([...reduceSamples(times, values, 4).values]).toEqual([1, 9, 2]);
    expect([...reduceSamples(times, values, 3).values]).toEqual([1, 2]);
    expect([...reduceSamples(times, values, 0).values]).toEqual([1, 2]);
  });
});
