/**
 * The middle one; the mean of the two in the middle where there is an even number.
 * @param {readonly number[]} values
 * @returns {number} NaN for none
 */
export function median(values) {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  if (sorted.length % 2 === 1) {
    return sorted[Math.floor(middle)];
  }
  return (sorted[middle - 1] + sorted[middle]) / 2;
}

/**
 * The value that a share of all values does not exceed (nearest rank).
 * @param {readonly number[] | Float64Array} values
 * @param {number} share from 0 to 1
 * @returns {number} NaN for none
 */
export function percentile(values, share) {
  const sorted = Float64Array.from(values).sort();
  return sorted[Math.max(0, Math.ceil(sorted.length * share) - 1)] ?? NaN;
}
