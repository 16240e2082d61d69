import type { Outcome } from '#shared/checklist/judgement';
import { unreachable } from '#shared/failures/unreachable';
import { COLOURS, type Colour } from './colours';
import type { Sheet } from './sheet';

/** An outcome, or `waiting` for a step that still needs something. */
export type MarkKind = Outcome | 'waiting';

/** The colour of an outcome's word; the shape says the same without it. */
export const MARK_COLOURS: Readonly<Record<MarkKind, Colour>> = {
  within: COLOURS.copper,
  outside: COLOURS.plum,
  recorded: COLOURS.ink,
  notApplicable: COLOURS.inkSoft,
  waiting: COLOURS.ochre,
};

const R = 4;

/** The drawn mark of an outcome around its centre: a joint, a wedge towards the side it lies on, a dot, a struck ring, a half-ring. */
export function drawOutcomeMark(
  sheet: Sheet,
  x: number,
  y: number,
  kind: MarkKind,
  side: 'low' | 'high' | null,
): void {
  const { doc } = sheet;
  switch (kind) {
    case 'within':
      doc.circle(x, y, R * 0.85).fill(COLOURS.copper);
      sheet.line(x - R * 1.35, y - R * 0.8, x - R * 1.35, y + R * 0.8, COLOURS.copper, 1);
      sheet.line(x + R * 1.35, y - R * 0.8, x + R * 1.35, y + R * 0.8, COLOURS.copper, 1);
      return;
    case 'outside': {
      const way = side === 'low' ? -1 : 1;
      doc
        .moveTo(x - way * R, y - R)
        .lineTo(x + way * R * 1.3, y)
        .lineTo(x - way * R, y + R)
        .closePath();
      doc.fill(COLOURS.plum);
      return;
    }
    case 'recorded':
      doc.circle(x, y, R * 0.6).fill(COLOURS.ink);
      return;
    case 'notApplicable':
      doc
        .lineWidth(1)
        .strokeColor(COLOURS.inkSoft)
        .circle(x, y, R * 0.9)
        .stroke();
      sheet.line(x - R * 1.1, y + R * 1.1, x + R * 1.1, y - R * 1.1, COLOURS.inkSoft, 1);
      return;
    case 'waiting':
      doc.lineWidth(1.6).strokeColor(COLOURS.ochre);
      doc.path(`M ${x - R} ${y} A ${R} ${R} 0 0 0 ${x + R} ${y}`).stroke();
      return;
    default:
      unreachable(kind);
  }
}
