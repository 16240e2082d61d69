import { findRefrigerant } from './refrigerants';

/** Blends have numbers from 400 to 599 and capital letters; the letters of isomers are small. */
const isBlend = (number: number): boolean => number >= 400 && number < 600;

/**
 * A refrigerant's designation as it is usually written, so that a checklist which asks for "R-454C" also finds the one
 * that somebody wrote as "r454c".
 *
 * @param text as written on a sheet or by a person
 * @returns such as "R-600a" or "R-1234ze(E)"; a text that isn't made like a designation stays as it is, but for spaces
 *   around it
 * @source ANSI/ASHRAE Standard 34, numbering of refrigerants (from memory)
 * @example usualDesignation('r 454c') // 'R-454C'
 */
export function usualDesignation(text: string): string {
  const known = findRefrigerant(text);
  if (known) return known.designation;
  const match = /^\s*R?[-\s]?(\d{2,4})\s?([A-Z]{0,3})(?:\(([EZ])\))?\s*$/i.exec(text);
  const [, number = '', letters = '', isomer] = match ?? [];
  // Three letters without a bracket may have an isomer's letter as their last one.
  if (!match || (letters.length > 2 && isomer === undefined)) return text.trim();
  const suffix = isBlend(Number(number)) ? letters.toUpperCase() : letters.toLowerCase();
  return `R-${number}${suffix}${isomer === undefined ? '' : `(${isomer.toUpperCase()})`}`;
}
