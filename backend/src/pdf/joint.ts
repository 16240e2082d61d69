import type { Joint } from '#shared/contracts/openings';
import { unreachable } from '#shared/failures/unreachable';
import { COLOURS } from './colours';
import type { Sheet } from './sheet';

/** What a joint can show: the states of a circuit. */
export type JointState = Joint['state'];

/** Whether the copper has got as far as this joint. */
export const isReached = (state: JointState): boolean =>
  state === 'approved' || state === 'submitted' || state === 'underWay';

/**
 * One joint of a copper line around its centre: an open ring, half-filled while the work is under way or waits for a
 * review, filled with a small collar when approved, the line broken and its ends offset when sent back.
 *
 * @param radius in points; everything else scales with it
 */
export function drawJoint(sheet: Sheet, x: number, y: number, radius: number, state: JointState): void {
  const { doc } = sheet;
  const stroke = Math.max(0.9, radius * 0.3);
  switch (state) {
    case 'noSequence':
      sheet.line(
        x - radius * 0.6,
        y - radius * 0.8,
        x + radius * 0.6,
        y + radius * 0.8,
        COLOURS.rule,
        stroke * 0.8,
      );
      return;
    case 'open':
      doc.lineWidth(stroke).circle(x, y, radius).fillAndStroke(COLOURS.white, COLOURS.rule);
      return;
    case 'underWay':
    case 'submitted':
      drawHalf(sheet, x, y, radius, stroke, state);
      return;
    case 'approved':
      doc.circle(x, y, radius).fill(COLOURS.copper);
      sheet.line(x - radius * 1.5, y - radius, x - radius * 1.5, y + radius, COLOURS.copper, stroke);
      sheet.line(x + radius * 1.5, y - radius, x + radius * 1.5, y + radius, COLOURS.copper, stroke);
      return;
    case 'sentBack':
      doc.rect(x - radius * 1.3, y - radius * 1.5, radius * 2.6, radius * 3).fill(COLOURS.white);
      sheet.line(
        x - radius * 1.5,
        y - radius * 0.75,
        x + radius * 0.2,
        y - radius * 0.75,
        COLOURS.plum,
        stroke * 1.3,
      );
      sheet.line(
        x - radius * 0.2,
        y + radius * 0.75,
        x + radius * 1.5,
        y + radius * 0.75,
        COLOURS.plum,
        stroke * 1.3,
      );
      return;
    default:
      unreachable(state);
  }
}

/** The lower third filled while under way, the left half once submitted, so that the two differ in print. */
function drawHalf(
  sheet: Sheet,
  x: number,
  y: number,
  radius: number,
  stroke: number,
  state: 'underWay' | 'submitted',
): void {
  const { doc } = sheet;
  doc.circle(x, y, radius).fill(COLOURS.white);
  doc.save();
  if (state === 'submitted') doc.rect(x - radius, y - radius, radius, radius * 2).clip();
  else doc.rect(x - radius, y + radius * 0.2, radius * 2, radius * 0.8).clip();
  doc.circle(x, y, radius).fill(COLOURS.copperLine);
  doc.restore();
  doc.lineWidth(stroke).strokeColor(COLOURS.copper).circle(x, y, radius).stroke();
}
