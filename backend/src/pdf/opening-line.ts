import type { Block } from './block';
import { COLOURS } from './colours';
import { drawJoint } from './joint';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

/** One system's stretch of an opening's copper line. */
export interface LineSegment {
  readonly name: string;
  readonly approved: number;
  readonly total: number;
}

const RADIUS = 5;
/** Room right of a joint for its collar, before the next stretch begins. */
const COLLAR = RADIUS * 1.6;

/** How much of a stretch is brazed: as much as is approved, and the last bit only with the last circuit. */
export function brazedShare({ approved, total }: Pick<LineSegment, 'approved' | 'total'>): number {
  return total === 0 ? 0 : Math.min(1, approved / total);
}

/**
 * An opening as one run of pipe: a stretch a system, copper as far as its circuits are approved, its joint closed when all
 * of them are.
 *
 * @param alt what the line says, for a screen reader
 */
export function openingLine(segments: readonly LineSegment[], alt: string): Block {
  return {
    height: 34,
    draw: (sheet, top) =>
      sheet.tagged(
        'Figure',
        () => {
          const width = TEXT_WIDTH / Math.max(1, segments.length);
          segments.forEach((segment, index) =>
            drawSegment(sheet, segment, PAGE.left + index * width, width, top),
          );
        },
        alt,
      ),
  };
}

function drawSegment(sheet: Sheet, segment: LineSegment, from: number, width: number, top: number): void {
  const y = top + 9;
  const to = from + width;
  const share = brazedShare(segment);
  const joint = to - COLLAR - 1;
  // Pipe that hangs there but isn't brazed: its two walls only.
  sheet.line(from, y - 1.4, to, y - 1.4, COLOURS.rule, 0.5);
  sheet.line(from, y + 1.4, to, y + 1.4, COLOURS.rule, 0.5);
  if (share > 0)
    sheet.line(
      from,
      y,
      share === 1 ? to : from + (joint - RADIUS - from) * share,
      y,
      COLOURS.copperLine,
      3.2,
    );
  drawJoint(sheet, joint, y, RADIUS, share === 1 ? 'approved' : 'open');
  const style = STYLES.small;
  const label = `${segment.name} ${segment.approved}/${segment.total}`;
  sheet.text(sheet.fitted(label, style, width - 8), from, baselineOf(y + 10, style), style);
}
