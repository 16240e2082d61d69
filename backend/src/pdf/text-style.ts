import { COLOURS, type Colour } from './colours';
import type { Face } from './fonts';

/** How words are set. Sizes are in points; `lead` is the distance from line to line. */
export interface TextStyle {
  readonly face: Face;
  readonly size: number;
  readonly lead: number;
  readonly colour: Colour;
}

const style = (face: Face, size: number, lead: number, colour: Colour = COLOURS.ink): TextStyle => ({
  face,
  size,
  lead,
  colour,
});

/** The document's few sizes. Words are Work Sans, readings and ids IBM Plex Mono. */
export const STYLES = {
  display: style('strong', 34, 40),
  chapter: style('strong', 22, 28),
  section: style('strong', 12.5, 17),
  step: style('medium', 10.5, 14),
  lead: style('body', 13, 19),
  body: style('body', 9.5, 13.5),
  strong: style('medium', 9.5, 13.5),
  small: style('body', 8, 11, COLOURS.inkSoft),
  label: style('medium', 8, 11, COLOURS.inkSoft),
  caution: style('medium', 8.5, 12, COLOURS.ochre),
  mono: style('mono', 8.5, 12.5),
  monoSmall: style('mono', 7.5, 10.5, COLOURS.inkSoft),
  reading: style('monoMedium', 17, 22),
  code: style('monoMedium', 34, 42),
} as const satisfies Record<string, TextStyle>;
