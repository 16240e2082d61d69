import { cellNumber, type DecimalComma } from './cell-number';

/** Whether the cell's only mark could group thousands: "1,234", never "0,125" or "12,5". */
const couldGroup = (text: string): boolean => /^[-+]?[1-9]\d{0,2}[.,]\d{3}$/.test(text);

/**
 * Which mark is the decimal one, by the rows' own evidence: a comma that can't group thousands says that it is the comma,
 * a dot that can't says that it is the dot. Without evidence "1,234" stays unread.
 *
 * @param rows cells of the first rows
 * @param told what a person said; it counts only where the file shows nothing else
 * @returns true for the comma, false for the dot, 'auto' where nothing or both are shown
 */
export function decimalMark(rows: readonly (readonly string[])[], told: boolean | undefined): DecimalComma {
  let commas = 0;
  let dots = 0;
  for (const cells of rows) {
    for (const cell of cells) {
      const text = cell.trim();
      const number = cellNumber(text, 'auto');
      if (typeof number !== 'number' || couldGroup(text)) continue;
      if (text.lastIndexOf(',') > text.lastIndexOf('.')) commas++;
      else if (text.includes('.')) dots++;
    }
  }
  if (commas > 0 && dots === 0) return true;
  if (dots > 0 && commas === 0) return false;
  return told ?? 'auto';
}
