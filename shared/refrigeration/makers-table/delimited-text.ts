/** One line of a pasted table with its number in the text, counted from 1. */
export interface TextRow {
  readonly row: number;
  readonly cells: readonly string[];
}

export type Delimiter = '\t' | ';' | ',';

const DELIMITERS: readonly Delimiter[] = ['\t', ';', ','];

/**
 * A tab or a semicolon is never a decimal mark; a comma may be one, so it separates only where neither does. A title line
 * may hold any of them: what separates stands in at least half of the lines.
 */
function delimiterOf(lines: readonly string[]): Delimiter {
  const written = lines.filter((line) => line.trim() !== '');
  const separates = (delimiter: Delimiter): boolean =>
    written.filter((line) => line.includes(delimiter)).length * 2 >= written.length;
  return DELIMITERS.find(separates) ?? ',';
}

/** The cells of one line; a cell in double quotes may hold the delimiter, two quotes in it are one. */
function cellsOf(line: string, delimiter: Delimiter): string[] {
  const cells: string[] = [];
  let cell = '';
  let quoted = false;
  for (let index = 0; index < line.length; index += 1) {
    const character = line[index] ?? '';
    if (character === '"' && quoted && line[index + 1] === '"') {
      cell += '"';
      index += 1;
    } else if (character === '"') {
      quoted = !quoted;
    } else if (character === delimiter && !quoted) {
      cells.push(cell.trim());
      cell = '';
    } else {
      cell += character;
    }
  }
  return [...cells, cell.trim()];
}

/**
 * Splits pasted or uploaded text into rows of cells. Empty lines, and cells that are empty at the end of every line, are
 * left out.
 *
 * @param text with lines ended in any way
 * @returns rows in order with their line numbers, and the delimiter that was found
 * @example splitDelimited('°F;psig\n-40;4,9').delimiter // ';'
 */
export function splitDelimited(text: string): {
  readonly delimiter: Delimiter;
  readonly rows: readonly TextRow[];
} {
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/);
  const delimiter = delimiterOf(lines);
  const rows = lines
    .map((line, index) => ({ row: index + 1, cells: cellsOf(line, delimiter) }))
    .filter(({ cells }) => cells.some((cell) => cell !== ''));
  const width = Math.max(0, ...rows.map(({ cells }) => cells.findLastIndex((cell) => cell !== '') + 1));
  return { delimiter, rows: rows.map(({ row, cells }) => ({ row, cells: cells.slice(0, width) })) };
}
