/**
 * A length as drawings write it: 8', 8'-6", 8' 6 1/2".
 *
 * @param text of a cell
 * @returns feet, undefined when the text is in no such form or has 12 inches or more
 * @example readFeetAndInches(`8'-6"`) // 8.5
 */
export function readFeetAndInches(text: string): number | undefined {
  const match =
    /^(\d{1,4})\s*['’′]\s*-?\s*(?:(\d{1,2}(?:\.\d{1,3})?)(?:[\s-]+(\d{1,2})\/(\d{1,2}))?\s*["”″])?$/.exec(
      text,
    );
  if (!match) return undefined;
  const [, feet, inches = '0', upper = '0', lower = '1'] = match;
  const total = Number(inches) + Number(upper) / Number(lower);
  return total < 12 ? Number(feet) + total / 12 : undefined;
}
