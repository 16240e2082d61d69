/** Value of a curve at a place within its points. */
export type CurveFunction = (x: number) => number;

const at = (values: readonly number[], index: number): number => values[index] ?? NaN;

/** The slope at a point of the parabola through it and its two neighbours; at the ends through the three outermost. */
function parabolaSlopes(xs: readonly number[], secants: readonly number[]): number[] {
  const last = xs.length - 1;
  return xs.map((_, index) => {
    const middle = Math.min(Math.max(index, 1), last - 1);
    const before = at(xs, middle) - at(xs, middle - 1);
    const after = at(xs, middle + 1) - at(xs, middle);
    const bend = (at(secants, middle) - at(secants, middle - 1)) / (before + after);
    return at(secants, middle - 1) + bend * (2 * at(xs, index) - at(xs, middle) - at(xs, middle - 1));
  });
}

/** Scales the two slopes of each stretch back into the circle within which a cubic can't turn round. */
function limitSlopes(slopes: number[], secants: readonly number[]): void {
  secants.forEach((secant, index) => {
    const start = Math.max(at(slopes, index), 0);
    const end = Math.max(at(slopes, index + 1), 0);
    const length = Math.hypot(start, end) / secant;
    const scale = length > 3 ? 3 / length : 1;
    slopes[index] = start * scale;
    slopes[index + 1] = end * scale;
  });
}

function stretchOf(xs: readonly number[], x: number): number {
  let low = 0;
  let high = xs.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (at(xs, middle) <= x) low = middle;
    else high = middle;
  }
  return low;
}

/**
 * A smooth curve through rising points that never turns back between them: cubic Hermite stretches with limited slopes.
 *
 * @param xs ascending, at least three
 * @param ys ascending, one for each of `xs`
 * @returns the curve; NaN outside the points, never an extrapolation
 * @source F. N. Fritsch & R. E. Carlson, SIAM J. Numer. Anal. 17, 238 (1980); slopes start as three-point parabolas
 * @example monotoneCubic([0, 1, 2], [0, 1, 4])(1.5) // 2.25: a parabola comes back exactly
 */
export function monotoneCubic(xs: readonly number[], ys: readonly number[]): CurveFunction {
  const secants = xs.slice(1).map((x, index) => (at(ys, index + 1) - at(ys, index)) / (x - at(xs, index)));
  const slopes = parabolaSlopes(xs, secants);
  limitSlopes(slopes, secants);
  return (x) => {
    if (!(x >= at(xs, 0) && x <= at(xs, xs.length - 1))) return NaN;
    const index = stretchOf(xs, x);
    const width = at(xs, index + 1) - at(xs, index);
    const t = (x - at(xs, index)) / width;
    const rise = at(ys, index + 1) - at(ys, index);
    const start = width * at(slopes, index);
    const end = width * at(slopes, index + 1);
    return at(ys, index) + t * (start + t * (3 * rise - 2 * start - end + t * (start + end - 2 * rise)));
  };
}
