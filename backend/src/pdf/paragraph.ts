import type { Block } from './block';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import type { Sheet } from './sheet';
import type { TaggedElement } from './structure';
import type { TextStyle } from './text-style';

export interface ParagraphOptions {
  readonly x?: number;
  readonly width?: number;
  /** Structure element: `P`, or a heading's level. */
  readonly tag?: 'P' | 'H1' | 'H2' | 'H3' | 'H4' | 'Caption';
  readonly keepWithNext?: boolean;
  /** Drawn beside the first line, such as a mark in the gutter; passed over by a screen reader. */
  readonly ornament?: (sheet: Sheet, baseline: number) => void;
  /** Words at the right edge of the first line; the caller leaves room for them in `width`. */
  readonly aside?: { readonly text: string; readonly style: TextStyle };
}

/** Where the baseline lies in a line of the given lead, so that lines of different faces stand level. */
export const baselineOf = (top: number, style: TextStyle): number =>
  top + style.lead * 0.5 + style.size * 0.34;

/**
 * Words as one block a line, wrapped to the width. The first two and the last two lines stay together, so that no line
 * stands alone on a page; the rest may go over as many pages as it takes.
 */
export function paragraph(
  sheet: Sheet,
  text: string,
  style: TextStyle,
  options: ParagraphOptions = {},
): Block[] {
  const { x = PAGE.left, width = TEXT_WIDTH, tag = 'P', keepWithNext = false, ornament, aside } = options;
  const lines = sheet.wrap(text, style, width);
  const isHeading = tag.startsWith('H');
  let element: TaggedElement | undefined;
  return lines.map((line, index) => {
    const isLast = index === lines.length - 1;
    const staysWithNext = isHeading || index === 0 || index === lines.length - 2;
    return {
      height: style.lead,
      keepWithNext: isLast ? keepWithNext || isHeading : staysWithNext,
      draw: (page, top) => {
        const baseline = baselineOf(top, style);
        if (index === 0 && ornament) page.artifact(() => ornament(page, baseline));
        element ??= page.parent.child(tag);
        element.mark(() => page.text(line, x, baseline, style));
        if (index === 0 && aside) {
          element.mark(() => page.text(aside.text, PAGE.right, baseline, aside.style, 'right'));
        }
        if (isLast) element.end();
      },
    };
  });
}

/** A hairline across the text. */
export function hairline(colour: string, x: number = PAGE.left, thickness = 0.6): Block {
  return {
    height: 1,
    draw: (sheet, top) =>
      sheet.artifact(() => sheet.line(x, top + 0.5, PAGE.right, top + 0.5, colour, thickness)),
  };
}
