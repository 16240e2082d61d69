import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import type { TaggedElement } from './structure';
import { STYLES, type TextStyle } from './text-style';

export interface Column {
  readonly title: string;
  /** Share of the table's width; shares need not add up to anything. */
  readonly share: number;
  readonly style?: TextStyle;
  readonly align?: 'left' | 'right';
}

export interface Cell {
  readonly text: string;
  readonly style?: TextStyle;
  /** Drawn left of the words, 14 points wide; passed over by a screen reader. */
  readonly mark?: (sheet: Sheet, x: number, y: number) => void;
}

export interface TableOptions {
  readonly x?: number;
  readonly width?: number;
  /** The first cell of a row names the row. */
  readonly hasRowHeads?: boolean;
  /** Above and below the words of a row, in points. */
  readonly padding?: number;
}

const PADDING = 4;
const COLUMN_GAP = 10;
const MARK_WIDTH = 14;
/** A cell with more lines goes on in another row, so that a row always fits on a page. */
const MAX_LINES = 30;

interface Placed {
  readonly x: number;
  readonly width: number;
  readonly column: Column;
}

/** A table with ruled rows, as blocks: one a row. Its head is drawn again at the top of every page it goes on to. */
export function ruledTable(
  sheet: Sheet,
  columns: readonly Column[],
  rows: readonly (readonly Cell[])[],
  options: TableOptions = {},
): Block[] {
  const { x = PAGE.left, width = TEXT_WIDTH, hasRowHeads = false, padding = PADDING } = options;
  const placed = placeColumns(columns, x, width);
  const tag: { table?: TaggedElement } = {};
  const head = headBlock(sheet, placed, tag, { x, width });
  const body = rows.flatMap((row) => splitRow(sheet, placed, row));
  const blocks = body.map((row, index): Block => {
    const isLast = index === body.length - 1;
    return rowBlock(placed, row, { tag, x, width, isLast, hasRowHeads, padding, head });
  });
  return [{ ...head, keepWithNext: blocks.length > 0 }, ...blocks];
}

function placeColumns(columns: readonly Column[], x: number, width: number): Placed[] {
  const shares = columns.reduce((sum, column) => sum + column.share, 0);
  const usable = width - COLUMN_GAP * (columns.length - 1);
  let left = x;
  return columns.map((column) => {
    const own = (usable * column.share) / shares;
    const place = { x: left, width: own, column };
    left += own + COLUMN_GAP;
    return place;
  });
}

function headBlock(
  sheet: Sheet,
  placed: readonly Placed[],
  tag: { table?: TaggedElement },
  { x, width }: { x: number; width: number },
): Block {
  const style = STYLES.label;
  const titles = placed.map((place) => sheet.wrap(place.column.title, style, place.width));
  const count = Math.max(1, ...titles.map((lines) => lines.length));
  const height = count * style.lead + PADDING + 2;
  return {
    height,
    draw: (page, top) => {
      const drawTitle = (index: number): void => {
        const place = placed[index];
        if (place) drawLines(page, titles[index] ?? [], place, top, style);
      };
      if (tag.table) page.artifact(() => placed.forEach((_, index) => drawTitle(index)));
      else {
        tag.table = page.parent.child('Table');
        const row = tag.table.child('TR');
        placed.forEach((_, index) =>
          row
            .child('TH')
            .mark(() => drawTitle(index))
            .end(),
        );
        row.end();
      }
      page.artifact(() => page.line(x, top + height - 1, x + width, top + height - 1, COLOURS.ink, 0.8));
    },
  };
}

interface RowPart {
  readonly cells: readonly Cell[];
  readonly lines: readonly (readonly string[])[];
}

function styleOf(cell: Cell, place: Placed): TextStyle {
  return cell.style ?? place.column.style ?? STYLES.body;
}

function splitRow(sheet: Sheet, placed: readonly Placed[], cells: readonly Cell[]): RowPart[] {
  const lines = placed.map((place, index) => {
    const cell = cells[index] ?? { text: '' };
    const width = place.width - (cell.mark ? MARK_WIDTH : 0);
    return sheet.wrap(cell.text, styleOf(cell, place), width);
  });
  const longest = Math.max(1, ...lines.map((list) => list.length));
  const parts: RowPart[] = [];
  for (let from = 0; from < longest; from += MAX_LINES) {
    parts.push({
      cells: from === 0 ? cells : cells.map(({ mark: _mark, ...rest }) => rest),
      lines: lines.map((list) => list.slice(from, from + MAX_LINES)),
    });
  }
  return parts;
}

function rowBlock(
  placed: readonly Placed[],
  row: RowPart,
  options: {
    tag: { table?: TaggedElement };
    x: number;
    width: number;
    isLast: boolean;
    hasRowHeads: boolean;
    padding: number;
    head: Block;
  },
): Block {
  const { tag, x, width, isLast, hasRowHeads, padding, head } = options;
  const heights = placed.map((place, index) => {
    const cell = row.cells[index] ?? { text: '' };
    return (row.lines[index]?.length ?? 0) * styleOf(cell, place).lead;
  });
  const height = Math.max(...heights) + padding * 2;
  return {
    height,
    repeated: head,
    draw: (page, top) => {
      const element = (tag.table ?? page.parent).child('TR');
      placed.forEach((place, index) => {
        const cell = row.cells[index] ?? { text: '' };
        const style = styleOf(cell, place);
        const { mark } = cell;
        if (mark)
          page.artifact(() => mark(page, place.x + 5, baselineOf(top + padding, style) - style.size * 0.33));
        const own = mark ? { ...place, x: place.x + MARK_WIDTH } : place;
        element
          .child(index === 0 && hasRowHeads ? 'TH' : 'TD')
          .mark(() => drawLines(page, row.lines[index] ?? [], own, top + padding, style))
          .end();
      });
      element.end();
      page.artifact(() =>
        page.line(x, top + height - 0.5, x + width, top + height - 0.5, COLOURS.faintRule, 0.6),
      );
      if (isLast) tag.table?.end();
    },
  };
}

function drawLines(
  sheet: Sheet,
  lines: readonly string[],
  place: Placed,
  top: number,
  style: TextStyle,
): void {
  const isRight = place.column.align === 'right';
  lines.forEach((line, index) => {
    const baseline = baselineOf(top + index * style.lead, style);
    sheet.text(line, isRight ? place.x + place.width : place.x, baseline, style, isRight ? 'right' : 'left');
  });
}
