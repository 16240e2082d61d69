import { COLOURS } from './colours';
import type { Sheet } from './sheet';

/** A hatched ochre edge, 4 points wide: what stands right of it is a caution. */
export function drawHatchedEdge(sheet: Sheet, x: number, top: number, height: number): void {
  const { doc } = sheet;
  doc.save();
  doc.rect(x, top, 4, height).clip();
  for (let y = top - 4; y < top + height + 4; y += 3)
    sheet.line(x - 1, y + 5, x + 5, y - 1, COLOURS.ochre, 0.9);
  doc.restore();
}
