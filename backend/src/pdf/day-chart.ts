import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

const DAY_S = 86_400;
const HOUR_S = 3600;
const PLOT_LEFT = PAGE.left + 58;
const PLOT_WIDTH = PAGE.right - PLOT_LEFT;
const ROW = 10;
const BAR = 6;
const STRIP = 30;

export interface DayPieces {
  readonly fromS: number;
  readonly toS: number;
}

export interface DayRow {
  readonly label: string;
  readonly bars: readonly {
    readonly full: readonly DayPieces[];
    readonly open: readonly DayPieces[];
    readonly isMarked: boolean;
  }[];
  readonly shaded: readonly DayPieces[];
  /** What somebody hears who can't see the row. */
  readonly alt: string;
}

export interface DayStrip {
  readonly label: string;
  /** From each moment to the next, the last to midnight; the first is at 0. */
  readonly steps: readonly { readonly fromS: number; readonly value: number }[];
  readonly limit: number | null;
  readonly alt: string;
}

const at = (second: number): number => PLOT_LEFT + (PLOT_WIDTH * second) / DAY_S;

/** The hours over a chart of one day, under a title. */
export function dayHead(title: string): Block {
  return {
    height: 26,
    keepWithNext: true,
    draw: (sheet, top) => {
      sheet.tagged('P', () =>
        sheet.text(
          sheet.fitted(title, STYLES.label, 300),
          PAGE.left,
          baselineOf(top + 1, STYLES.label),
          STYLES.label,
        ),
      );
      sheet.artifact(() => {
        for (let hour = 0; hour <= 24; hour += 3) {
          const align = hour === 24 ? 'right' : hour === 0 ? 'left' : 'centre';
          sheet.text(
            `${String(hour).padStart(2, '0')}:00`,
            at(hour * HOUR_S),
            top + 22,
            STYLES.monoSmall,
            align,
          );
        }
        sheet.line(PLOT_LEFT, top + 25.5, PAGE.right, top + 25.5, COLOURS.ink, 0.8);
      });
    },
  };
}

/** One row of a chart of one day: filled bars with an open end, marked ones with a wedge. */
export const dayRow = (row: DayRow, head: Block): Block => ({
  height: ROW,
  repeated: head,
  draw: (sheet, top) => sheet.tagged('Figure', () => drawRow(sheet, row, top), row.alt),
});

function drawRow(sheet: Sheet, row: DayRow, top: number): void {
  const { doc } = sheet;
  for (const { fromS, toS } of row.shaded) hatch(sheet, at(fromS), top, at(toS) - at(fromS), ROW);
  drawHours(sheet, top, ROW);
  sheet.text(sheet.fitted(row.label, STYLES.monoSmall, 52), PAGE.left, top + 7.5, STYLES.monoSmall);
  const y = top + (ROW - BAR) / 2;
  for (const bar of row.bars) {
    const colour = bar.isMarked ? COLOURS.plum : COLOURS.frost;
    for (const { fromS, toS } of bar.full) doc.rect(at(fromS), y, at(toS) - at(fromS), BAR).fill(colour);
    for (const { fromS, toS } of bar.open)
      doc
        .lineWidth(0.5)
        .rect(at(fromS), y + 0.25, at(toS) - at(fromS), BAR - 0.5)
        .fillAndStroke(COLOURS.white, colour);
    if (bar.isMarked) drawMark(sheet, bar.full[0], top, y);
  }
  sheet.line(PLOT_LEFT, top + ROW, PAGE.right, top + ROW, COLOURS.faintRule, 0.4);
}

function drawMark(sheet: Sheet, piece: DayPieces | undefined, top: number, y: number): void {
  if (!piece) return;
  const x = at(piece.fromS);
  sheet.doc
    .lineWidth(1.2)
    .strokeColor(COLOURS.ink)
    .rect(x, y, at(piece.toS) - x, BAR)
    .stroke();
  sheet.doc
    .moveTo(x - 2.5, top - 0.5)
    .lineTo(x + 2.5, top - 0.5)
    .lineTo(x, top + 3.5)
    .closePath()
    .fill(COLOURS.ink);
}

/** A stepped line over the day under its rows, with its limit. */
export const dayStrip = (strip: DayStrip): Block => ({
  height: STRIP + 6,
  draw: (sheet, top) => sheet.tagged('Figure', () => drawStrip(sheet, strip, top), strip.alt),
});

function drawStrip(sheet: Sheet, { label, steps, limit }: DayStrip, top: number): void {
  const { doc } = sheet;
  const floor = top + STRIP;
  const height = STRIP - 12;
  const most = Math.max(limit ?? 0, ...steps.map(({ value }) => value)) * 1.05;
  const y = (value: number): number => (most > 0 ? floor - (height * value) / most : floor);
  sheet.text(sheet.fitted(label, STYLES.monoSmall, PLOT_WIDTH), PLOT_LEFT, top + 9, STYLES.monoSmall);
  drawHours(sheet, floor - height, height);
  steps.forEach(({ fromS, value }, index) => {
    const toS = steps[index + 1]?.fromS ?? DAY_S;
    if (value > 0) doc.rect(at(fromS), y(value), at(toS) - at(fromS), floor - y(value)).fill(COLOURS.frost);
  });
  sheet.line(PLOT_LEFT, floor, PAGE.right, floor, COLOURS.rule, 0.6);
  if (limit !== null) sheet.line(PLOT_LEFT, y(limit), PAGE.right, y(limit), COLOURS.copper, 1);
}

function drawHours(sheet: Sheet, top: number, height: number): void {
  for (let hour = 0; hour <= 24; hour += 3)
    sheet.line(at(hour * HOUR_S), top, at(hour * HOUR_S), top + height, COLOURS.faintRule, 0.4);
}

function hatch(sheet: Sheet, x: number, top: number, width: number, height: number): void {
  const { doc } = sheet;
  doc.save();
  doc.rect(x, top, width, height).clip();
  for (let from = x - height; from < x + width; from += 3)
    sheet.line(from, top + height, from + height, top, COLOURS.faintRule, 0.5);
  doc.restore();
}
