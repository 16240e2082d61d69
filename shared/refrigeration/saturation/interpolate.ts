/**
 * A straight line between the two points around `x`. The caller has made sure that `x` lies within the points; just
 * outside (by rounding) the first or last line is used.
 *
 * @param xs ascending, at least two
 * @param ys one for each of `xs`
 * @param x where the value is wanted
 * @returns the value there, in the unit of `ys`; NaN when there are fewer than two points
 */
export function interpolate(xs: Float64Array, ys: Float64Array, x: number): number {
  let low = 0;
  let high = xs.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if ((xs[middle] ?? NaN) <= x) low = middle;
    else high = middle;
  }
  const x0 = xs[low] ?? NaN;
  const x1 = xs[high] ?? NaN;
  const y0 = ys[low] ?? NaN;
  const y1 = ys[high] ?? NaN;
  return y0 + ((x - x0) / (x1 - x0)) * (y1 - y0);
}
