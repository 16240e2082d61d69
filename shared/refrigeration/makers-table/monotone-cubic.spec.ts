import { describe, expect, it } from '@jest/globals';
import * as fc from 'fast-check';
import { monotoneCubic } from './monotone-cubic';

// The example of Fritsch and Carlson (RPN 14, LLL radiochemical data), from memory: flat, then a steep rise.
const XS = [7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20];
const YS = [1e-6, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.94374, 0.998636, 0.999919, 0.999994];

describe('monotoneCubic', () => {
  it('goes through its points', () => {
    const curve = monotoneCubic(XS, YS);
    XS.forEach((x, index) => expect(curve(x)).toBeCloseTo(YS[index] ?? NaN, 12));
  });

  it('brings a rising parabola back exactly, evenly spaced or not', () => {
    const xs = [0, 1, 1.5, 3, 4];
    const curve = monotoneCubic(
      xs,
      xs.map((x) => x * x),
    );
    for (const x of [0.25, 1.2, 2, 3.9]) expect(curve(x)).toBeCloseTo(x * x, 12);
  });

  it('keeps rising where a parabola would swing over', () => {
    const curve = monotoneCubic(XS, YS);
    let before = -Infinity;
    for (let x = 7.99; x <= 20; x += 0.005) {
      expect(curve(x)).toBeGreaterThanOrEqual(before);
      before = curve(x);
    }
  });

  it('has no value outside its points', () => {
    const curve = monotoneCubic([0, 1, 2], [0, 1, 4]);
    for (const x of [-1e-9, 2 + 1e-9, NaN, Infinity]) expect(curve(x)).toBeNaN();
  });

  it('never turns back, whatever the rising points', () => {
    const steps = fc.array(
      fc.tuple(
        fc.double({ min: 0.01, max: 10, noNaN: true }),
        fc.double({ min: 0.001, max: 10, noNaN: true }),
      ),
      { minLength: 3, maxLength: 12 },
    );
    fc.assert(
      fc.property(steps, (taken) => {
        let x = 0;
        let y = 0;
        const xs: number[] = [];
        const ys: number[] = [];
        for (const [width, rise] of taken) {
          xs.push((x += width));
          ys.push((y += rise));
        }
        const curve = monotoneCubic(xs, ys);
        const first = xs[0] ?? NaN;
        let before = -Infinity;
        for (let part = 0; part <= 200; part += 1) {
          const value = curve(Math.min(first + ((x - first) * part) / 200, x));
          expect(value).toBeGreaterThanOrEqual(before - 1e-12 * y);
          before = value;
        }
      }),
    );
  });
});
