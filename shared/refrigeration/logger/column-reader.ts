import type { UnitId } from '../../units/unit';
import { cellNumber, type DecimalComma } from './cell-number';
import type { UnreadableCell } from './logger-file';
import { NumberList } from './number-list';

/** How many unreadable cells are shown; a person needs a few examples, not a copy of the file. */
export const CELLS_LISTED = 20;
const LONGEST_TEXT = 40;

/** A cell for the list of unreadable ones. */
export const unreadableCell = (row: number, heading: string, text: string): UnreadableCell => ({
  row,
  heading,
  text: text.trim().slice(0, LONGEST_TEXT),
});

/** Reads one column's cells, row after row. */
export class ColumnReader {
  readonly values = new NumberList();
  readonly firstUnreadable: UnreadableCell[] = [];
  unreadable = 0;
  ambiguous = 0;
  empty = 0;
  readable = 0;

  constructor(
    readonly heading: string,
    readonly unit: UnitId | null,
    readonly index: number,
    private readonly decimalComma: DecimalComma,
  ) {}

  read(text: string, row: number): void {
    const number = cellNumber(text, this.decimalComma);
    if (typeof number === 'number') {
      this.values.push(number);
      this.readable++;
      return;
    }
    this.values.push(NaN);
    if (number === 'empty') {
      this.empty++;
      return;
    }
    if (number === 'ambiguous') this.ambiguous++;
    this.unreadable++;
    if (this.firstUnreadable.length < CELLS_LISTED) {
      this.firstUnreadable.push(unreadableCell(row, this.heading, text));
    }
  }
}
