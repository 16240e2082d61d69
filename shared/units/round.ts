/** Moves the decimal point in the shortest text of the number, so that 1.005 is treated as written. */
function shiftDecimalPoint(value: number, places: number): number {
  const [mantissa = '0', exponent = '0'] = String(value).split('e');
  return Number(`${mantissa}e${Number(exponent) + places}`);
}

/**
 * Rounds half away from zero: 1.005 to two decimals is 1.01, −2.5 to none is −3. The only rounding in the product; it
 * is done once, where a value is shown.
 *
 * @param value any number; NaN and infinities come back as they are
 * @param decimals whole number of decimals, negative for tens and hundreds
 * @returns the rounded value, never −0
 * @example roundTo(1.005, 2) // 1.01
 */
export function roundTo(value: number, decimals: number): number {
  if (!Number.isFinite(value)) return value;
  const magnitude = shiftDecimalPoint(Math.round(shiftDecimalPoint(Math.abs(value), decimals)), -decimals);
  return value < 0 && magnitude !== 0 ? -magnitude : magnitude;
}
