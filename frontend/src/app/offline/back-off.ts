const FIRST_MS = 20_000;
const LONGEST_MS = 300_000;

/**
 * How long to wait before the next try.
 *
 * @param failures in a row, 0 when the last try worked
 * @param chance between 0 and 1, spreads phones that lost the network together
 * @returns milliseconds: 20 s, doubling up to 5 min, and up to a quarter more
 */
export function backOff(failures: number, chance: number): number {
  const base = Math.min(FIRST_MS * 2 ** Math.max(0, failures - 1), LONGEST_MS);
  return Math.round(base * (1 + chance / 4));
}
