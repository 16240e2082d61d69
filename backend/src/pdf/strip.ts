import { COLOURS } from './colours';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { stripScale, type StripFigures, type StripScale } from './strip-scale';
import { STYLES } from './text-style';

/** Height that a strip takes, its limits written below. */
export const STRIP_HEIGHT = 38;
const BAR_TOP = 12;
const BAR_HEIGHT = 9;

export interface StripPlace {
  readonly x: number;
  readonly top: number;
  readonly width: number;
  readonly isOutside: boolean;
  /** The limits as words under the channel's edges. */
  readonly lowText: string;
  readonly highText: string;
}

/**
 * Draws a strip: the target band as a channel in a ruled bar, a wedge for the value, a hollow one for the value as
 * found, a bracket below from the lowest to the highest of a hunting valve.
 */
export function drawStrip(sheet: Sheet, figures: StripFigures, place: StripPlace): void {
  const { doc } = sheet;
  const scale = stripScale(figures);
  const at = (figure: number): number =>
    place.x + (place.width * (figure - scale.from)) / (scale.to - scale.from);
  const bar = place.top + BAR_TOP;
  drawChannel(sheet, figures, place, at);
  doc.lineWidth(0.6).strokeColor(COLOURS.rule).rect(place.x, bar, place.width, BAR_HEIGHT).stroke();
  drawTicks(sheet, scale, bar, at);
  if (figures.asFound !== null) drawWedge(sheet, at(figures.asFound), bar, null);
  drawWedge(sheet, at(figures.value), bar, place.isOutside ? COLOURS.plum : COLOURS.ink);
  if (figures.hunting) drawBracket(sheet, at(figures.hunting.low), at(figures.hunting.high), bar);
}

function drawTicks(sheet: Sheet, scale: StripScale, bar: number, at: (figure: number) => number): void {
  for (const tick of scale.ticks)
    sheet.line(at(tick), bar + BAR_HEIGHT - 3, at(tick), bar + BAR_HEIGHT, COLOURS.rule, 0.5);
}

function drawChannel(
  sheet: Sheet,
  figures: StripFigures,
  place: StripPlace,
  at: (figure: number) => number,
): void {
  const { low, high } = figures;
  if (low === null && high === null) return;
  const bar = place.top + BAR_TOP;
  const from = low === null ? place.x : at(low);
  const to = high === null ? place.x + place.width : at(high);
  sheet.doc.rect(from, bar, to - from, BAR_HEIGHT).fill(COLOURS.channel);
  const style = STYLES.monoSmall;
  const baseline = baselineOf(bar + BAR_HEIGHT + 5, style);
  if (low !== null) sheet.line(from, bar - 1.5, from, bar + BAR_HEIGHT + 3, COLOURS.copper, 1.2);
  if (high !== null) sheet.line(to, bar - 1.5, to, bar + BAR_HEIGHT + 3, COLOURS.copper, 1.2);
  // Outward from a narrow channel, so that the two never run into each other.
  const isNarrow = low !== null && high !== null && to - from < 60;
  if (low !== null)
    sheet.text(place.lowText, from + (isNarrow ? 2 : 0), baseline, style, isNarrow ? 'right' : 'centre');
  if (high !== null)
    sheet.text(place.highText, to - (isNarrow ? 2 : 0), baseline, style, isNarrow ? 'left' : 'centre');
}

function drawWedge(sheet: Sheet, x: number, bar: number, colour: string | null): void {
  const { doc } = sheet;
  doc
    .moveTo(x - 4, bar - 8)
    .lineTo(x + 4, bar - 8)
    .lineTo(x, bar + 1)
    .closePath();
  if (colour === null) doc.lineWidth(0.8).fillAndStroke(COLOURS.white, COLOURS.inkSoft);
  else doc.fill(colour);
  if (colour !== null) sheet.line(x, bar, x, bar + BAR_HEIGHT, colour, 1);
}

function drawBracket(sheet: Sheet, from: number, to: number, bar: number): void {
  const y = bar + BAR_HEIGHT / 2;
  sheet.line(from, y, to, y, COLOURS.frost, 1.4);
  sheet.line(from, y - 3, from, y + 3, COLOURS.frost, 1.4);
  sheet.line(to, y - 3, to, y + 3, COLOURS.frost, 1.4);
}
