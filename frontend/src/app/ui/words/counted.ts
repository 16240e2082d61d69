/**
 * The translation key for so many of something: `key` + "One" for exactly one, `key` + "Many" otherwise. English and
 * Spanish need no more.
 *
 * @example countedKey('openings.circuits', 1) // 'openings.circuitsOne'
 */
export function countedKey(key: string, count: number): string {
  return `${key}${count === 1 ? 'One' : 'Many'}`;
}
