import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

export interface TrendFigures {
  /** Ascending. */
  readonly times: readonly number[];
  readonly values: readonly number[];
  readonly low: number | null;
  readonly high: number;
}

export interface TrendWords {
  readonly highText: string;
  readonly lowText: string;
  readonly startText: string;
  readonly endText: string;
  /** What somebody hears who can't see the drawing. */
  readonly alt: string;
}

const HEIGHT = 118;
const PLOT = { top: 6, height: 88, left: PAGE.left + 46, width: TEXT_WIDTH - 56 };

/** A line over time with its band as a channel, as on the strip. */
export function trendChart(figures: TrendFigures, words: TrendWords): Block {
  return {
    height: HEIGHT,
    draw: (sheet, top) => sheet.tagged('Figure', () => drawTrend(sheet, figures, words, top), words.alt),
  };
}

function drawTrend(sheet: Sheet, figures: TrendFigures, words: TrendWords, top: number): void {
  const { doc } = sheet;
  const { times, values, low, high } = figures;
  const [from, to] = [times[0] ?? 0, times.at(-1) ?? 1];
  const lowest = Math.min(low ?? high, ...minimumOf(values));
  const highest = Math.max(high, ...maximumOf(values));
  const margin = Math.max((highest - lowest) * 0.08, 0.5);
  const x = (time: number): number => PLOT.left + (PLOT.width * (time - from)) / Math.max(to - from, 1);
  const y = (value: number): number =>
    top + PLOT.top + (PLOT.height * (highest + margin - value)) / (highest - lowest + 2 * margin);
  const floor = top + PLOT.top + PLOT.height;
  doc.rect(PLOT.left, y(high), PLOT.width, (low === null ? floor : y(low)) - y(high)).fill(COLOURS.channel);
  sheet.line(PLOT.left, y(high), PLOT.left + PLOT.width, y(high), COLOURS.copper, 1);
  sheet.text(words.highText, PLOT.left - 4, y(high) + 3, STYLES.monoSmall, 'right');
  if (low !== null) {
    sheet.line(PLOT.left, y(low), PLOT.left + PLOT.width, y(low), COLOURS.copper, 1);
    sheet.text(words.lowText, PLOT.left - 4, y(low) + 3, STYLES.monoSmall, 'right');
  }
  sheet.line(PLOT.left, floor, PLOT.left + PLOT.width, floor, COLOURS.rule, 0.6);
  values.forEach((value, index) => {
    const point: [number, number] = [x(times[index] ?? from), y(value)];
    if (index === 0) doc.moveTo(...point);
    else doc.lineTo(...point);
  });
  doc.lineWidth(0.9).strokeColor(COLOURS.frost).stroke();
  sheet.text(words.startText, PLOT.left, floor + 11, STYLES.monoSmall, 'left');
  sheet.text(words.endText, PLOT.left + PLOT.width, floor + 11, STYLES.monoSmall, 'right');
}

// Not `Math.min(...values)` alone: thousands of arguments overflow the stack.
const minimumOf = (values: readonly number[]): [number] => [
  values.reduce((a, b) => Math.min(a, b), Infinity),
];
const maximumOf = (values: readonly number[]): [number] => [
  values.reduce((a, b) => Math.max(a, b), -Infinity),
];
