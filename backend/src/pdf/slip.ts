import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE } from './page-geometry';
import type { Sheet } from './sheet';

const TOOTH = 5;

/** A torn edge across the text: where a slip of working begins, and where it ends. */
export function tornEdge(x: number, side: 'top' | 'bottom'): Block {
  return {
    height: 8,
    keepWithNext: side === 'top',
    draw: (sheet, top) => sheet.artifact(() => drawEdge(sheet, x, side === 'top' ? top + 5 : top + 3, side)),
  };
}

function drawEdge(sheet: Sheet, x: number, y: number, side: 'top' | 'bottom'): void {
  const { doc } = sheet;
  doc.moveTo(x, y);
  const way = side === 'top' ? -1 : 1;
  for (let at = x, up = true; at < PAGE.right; at += TOOTH, up = !up) {
    doc.lineTo(Math.min(at + TOOTH, PAGE.right), up ? y + way * 2.2 : y);
  }
  doc.lineWidth(0.6).strokeColor(COLOURS.rule).stroke();
}
