import type { Judgement } from '#shared/checklist/judgement';
import { figureWords } from '#shared/checklist/words/figure-words';
import { FORMULA_WORDS } from '#shared/checklist/words/formula-words';
import type { FoldEntry } from '#shared/sequences/fold';
import { gap, kept, type Block } from '../../pdf/block';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { tornEdge } from '../../pdf/slip';
import { STYLES } from '../../pdf/text-style';
import { say, type DocumentContext } from './document-context';
import { judgedOf } from './judged-entry';

export type Working = Judgement['working'][number];

/** What was worked out as one column of a slip: its name, what was typed for a line without a working, and the working. */
export interface WorkingColumn {
  readonly title: string;
  /** By a line's label: what stands there when nothing was worked out. */
  readonly typed: Readonly<Record<string, string>>;
  readonly working: Working | undefined;
}

const SLIP_X = PAGE.left + 10;

/** The torn-edge slip below a result: every line of the working, a column for each time it was worked out. */
export function workingBlocks(context: DocumentContext, columns: readonly WorkingColumn[]): Block[] {
  const { sheet, words } = context;
  // Narrow for one column: a figure must not stand a page's width from its name.
  const width = Math.min(PAGE.right - SLIP_X, 170 + 100 * columns.length);
  const place = { x: SLIP_X, width };
  const reference = columns.find((column) => column.working)?.working;
  const table = ruledTable(
    sheet,
    [
      { title: words.superheat.working, share: 30 },
      ...columns.map((column) => ({
        title: column.title,
        share: 18,
        style: STYLES.mono,
        align: 'right' as const,
      })),
    ],
    workingRows(context, columns, reference).map((row) =>
      row.map((text, index) => (index === 0 ? { text, style: STYLES.small } : { text })),
    ),
    { ...place, hasRowHeads: true, padding: 1.5 },
  );
  const slip = [
    tornEdge(SLIP_X, 'top'),
    ...kept(table, true),
    gap(4),
    ...(reference ? explanation(context, reference) : []),
    tornEdge(SLIP_X, 'bottom'),
  ];
  return kept(slip);
}

function workingRows(
  context: DocumentContext,
  columns: readonly WorkingColumn[],
  reference: Working | undefined,
): string[][] {
  const { format } = context;
  const labels = reference?.lines.map((line) => line.label) ?? Object.keys(columns[0]?.typed ?? {});
  return labels.map((label) => [
    figureName(context, label),
    ...columns.map((column) => {
      const own = column.working?.lines.find((candidate) => candidate.label === label);
      return own ? format.quantity(own.value, own.unit) : (column.typed[label] ?? '—');
    }),
  ]);
}

/** A figure's name in the document's language; one that has none here yet is its key, spelled out. */
export function figureName(context: DocumentContext, label: string): string {
  const words = figureWords(label);
  return words ? say(context, words) : spelledOut(label);
}

function explanation(context: DocumentContext, working: Working): Block[] {
  const { sheet, words } = context;
  const said = FORMULA_WORDS[working.formula];
  const formula = said ? say(context, said) : spelledOut(working.formula);
  const place = { x: SLIP_X, width: TEXT_WIDTH - (SLIP_X - PAGE.left) };
  return [
    ...paragraph(sheet, `${words.superheat.formula} ${formula}`, STYLES.small, place),
    ...paragraph(
      sheet,
      `${words.superheat.source} ${shortSource(working.source)}; ${words.superheat.inFull}`,
      STYLES.small,
      place,
    ),
  ];
}

/** The table and the program behind it; its literature is long and stands once, at the end of the chapter. */
const shortSource = (source: string): string => source.split(';')[0] ?? source;

/** Sources of all workings among the entries, each once and in full. */
export function sourcesOf(entries: readonly FoldEntry[]): readonly string[] {
  return [
    ...new Set(entries.flatMap((entry) => (judgedOf(entry)?.working ?? []).map((working) => working.source))),
  ];
}

/** A key as words, for a figure that has no name here yet: "oilLevel" becomes "oil level". */
function spelledOut(key: string): string {
  return key.replace(
    /([a-z])([A-Z])/g,
    (_match, before: string, after: string) => `${before} ${after.toLowerCase()}`,
  );
}
