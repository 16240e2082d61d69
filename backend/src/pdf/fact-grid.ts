import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

export interface Fact {
  readonly label: string;
  readonly value: string;
}

const GAP = 18;
const PADDING = 3;

/** Facts as label over value, in columns, row by row with a hairline between. */
export function factGrid(sheet: Sheet, facts: readonly Fact[], columns: number): Block[] {
  const width = (TEXT_WIDTH - GAP * (columns - 1)) / columns;
  const rows: Block[] = [];
  for (let from = 0; from < facts.length; from += columns) {
    const cells = facts.slice(from, from + columns).map((fact) => ({
      label: fact.label,
      lines: sheet.wrap(fact.value === '' ? '—' : fact.value, STYLES.body, width),
    }));
    const longest = Math.max(...cells.map((cell) => cell.lines.length));
    const height = STYLES.label.lead + longest * STYLES.body.lead + PADDING * 2;
    rows.push({
      height,
      draw: (page, top) => {
        cells.forEach((cell, index) => {
          const x = PAGE.left + index * (width + GAP);
          page.tagged('P', () => {
            page.text(
              page.fitted(cell.label, STYLES.label, width),
              x,
              baselineOf(top + PADDING, STYLES.label),
              STYLES.label,
            );
            cell.lines.forEach((line, row) => {
              const y = top + PADDING + STYLES.label.lead + row * STYLES.body.lead;
              page.text(line, x, baselineOf(y, STYLES.body), STYLES.body);
            });
          });
        });
        const base = top + height - 0.5;
        page.artifact(() => page.line(PAGE.left, base, PAGE.right, base, COLOURS.faintRule, 0.6));
      },
    });
  }
  return rows;
}
