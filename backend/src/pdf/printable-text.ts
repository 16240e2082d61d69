// What must not reach a page: control characters, and marks that reorder, join or vary what stands around them. A name
// that turns the text after it around would print as something that nobody recorded.
const INVISIBLE = /(?![\n\t])\p{Cc}|\p{Default_Ignorable_Code_Point}/gu;
const SPACES = /[\t\u00A0\u2000-\u200A\u202F\u205F\u3000\u2028\u2029]/g;

const graphemes = new Intl.Segmenter('und', { granularity: 'grapheme' });

/**
 * The text as a face can print it: composed, its spaces plain, and every sign that the face lacks (a whole emoji counts as
 * one) replaced by a visible substitute, so that a reader sees that something stood there.
 *
 * @param has whether the face has a glyph for a code point
 * @param substitute a sign that the face has
 * @returns text in which only line feeds are control characters
 */
export function printableText(text: string, has: (codePoint: number) => boolean, substitute: string): string {
  const composed = text.normalize('NFC').replace(/\r\n?/g, '\n').replace(SPACES, ' ');
  const prints = (sign: string): boolean =>
    [...sign].every((part) => part === '\n' || has(part.codePointAt(0) ?? 0));
  const plain = composed.replace(INVISIBLE, '');
  if (prints(plain)) return plain;
  let result = '';
  // Cut into signs before the invisible joiners go: they are what holds one emoji together.
  for (const { segment } of graphemes.segment(composed)) {
    const sign = segment.replace(INVISIBLE, '');
    result += prints(sign) ? sign : substitute;
  }
  return result;
}
