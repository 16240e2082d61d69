import { UNITS } from '#shared/units/unit';

/**
 * Breaks text into lines. Line feeds are kept; a number is never parted from its unit; a word wider than a line is broken inside.
 *
 * @param text printable text
 * @param width of the line, in the unit of `measure`
 * @param measure width of a piece of text
 * @returns lines without trailing spaces; one empty line for empty text
 */
export function wrapText(text: string, width: number, measure: (piece: string) => number): string[] {
  const lines: string[] = [];
  for (const paragraph of text.split('\n')) lines.push(...wrapParagraph(paragraph, width, measure));
  return lines;
}

function wrapParagraph(paragraph: string, width: number, measure: (piece: string) => number): string[] {
  const space = measure(' ');
  const lines: string[] = [];
  let line = '';
  let used = 0;
  for (const word of wordsOf(paragraph)) {
    for (const piece of breakWord(word, width, measure)) {
      const size = measure(piece);
      if (line !== '' && used + space + size <= width) {
        line += ` ${piece}`;
        used += space + size;
        continue;
      }
      if (line !== '') lines.push(line);
      line = piece;
      used = size;
    }
  }
  lines.push(line);
  return lines;
}

const SYMBOLS: ReadonlySet<string> = new Set(Object.values(UNITS).map(({ symbol }) => symbol));

/** What stands between spaces, a number and its unit as one. */
function wordsOf(paragraph: string): string[] {
  const words: string[] = [];
  for (const piece of paragraph.split(' ').filter((part) => part !== '')) {
    const last = words.at(-1);
    const isUnit = SYMBOLS.has(piece.replace(/[,;.:]$/, ''));
    if (last !== undefined && isUnit && /\d$/.test(last)) words[words.length - 1] = `${last} ${piece}`;
    else words.push(piece);
  }
  return words;
}

/** Longer than any word that fits a line: measuring it whole would lay it out for nothing. */
const HOPELESS = 200;

function breakWord(word: string, width: number, measure: (piece: string) => number): string[] {
  if (word.length < HOPELESS && measure(word) <= width) return [word];
  const pieces: string[] = [];
  let piece = '';
  let used = 0;
  // Sign by sign, without kerning: measuring each growing piece would take quadratic time.
  for (const sign of word) {
    const size = measure(sign);
    if (piece !== '' && used + size > width) {
      pieces.push(piece);
      piece = '';
      used = 0;
    }
    piece += sign;
    used += size;
  }
  if (piece !== '') pieces.push(piece);
  return pieces;
}
