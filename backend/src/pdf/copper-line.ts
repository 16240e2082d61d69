import type { Block } from './block';
import { COLOURS } from './colours';
import { drawJoint, isReached, type JointState } from './joint';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

export interface LineJoint {
  readonly code: string;
  readonly state: JointState;
}

const SPACING = 40;
const RADIUS = 4.2;
const PER_ROW = Math.floor(TEXT_WIDTH / SPACING);
const ROW_HEIGHT = 36;

/**
 * A run of pipe with one joint a circuit, in as many rows as it takes, as blocks.
 *
 * @param alt what the line says, for a screen reader
 */
export function copperLine(joints: readonly LineJoint[], alt: string): Block[] {
  const rows: Block[] = [];
  for (let from = 0; from < joints.length; from += PER_ROW) {
    const part = joints.slice(from, from + PER_ROW);
    const before = from > 0;
    const after = from + PER_ROW < joints.length;
    rows.push({
      height: ROW_HEIGHT,
      draw: (sheet, top) =>
        from === 0
          ? sheet.tagged('Figure', () => drawRow(sheet, top, part, before, after), alt)
          : sheet.artifact(() => drawRow(sheet, top, part, before, after)),
    });
  }
  return rows;
}

function drawRow(
  sheet: Sheet,
  top: number,
  joints: readonly LineJoint[],
  before: boolean,
  after: boolean,
): void {
  const y = top + 11;
  joints.forEach((joint, index) => {
    const x = PAGE.left + SPACING * (index + 0.5);
    const from = index === 0 && !before ? x - SPACING * 0.3 : x - SPACING / 2;
    const isEnd = index === joints.length - 1 && !after;
    pipe(sheet, from, isEnd ? x + SPACING * 0.3 : x + SPACING / 2, y, isReached(joint.state));
  });
  joints.forEach((joint, index) => {
    const x = PAGE.left + SPACING * (index + 0.5);
    drawJoint(sheet, x, y, RADIUS, joint.state);
    const style = STYLES.monoSmall;
    sheet.text(sheet.fitted(joint.code, style, SPACING - 3), x, baselineOf(y + 7, style), style, 'centre');
  });
}

function pipe(sheet: Sheet, from: number, to: number, y: number, reached: boolean): void {
  if (reached) sheet.line(from, y, to, y, COLOURS.copperLine, 3);
  else {
    // Pipe that hangs there but isn't brazed: its two walls only.
    sheet.line(from, y - 1.4, to, y - 1.4, COLOURS.rule, 0.5);
    sheet.line(from, y + 1.4, to, y + 1.4, COLOURS.rule, 0.5);
  }
}
