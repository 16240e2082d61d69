import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatAnswer, SuperheatObservation } from '#shared/checklist/kinds/superheat';
import type { FoldEntry } from '#shared/sequences/fold';
import { gap, kept, type Block } from '../../pdf/block';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { tornEdge } from '../../pdf/slip';
import { STYLES } from '../../pdf/text-style';
import type { DocumentContext } from './document-context';
import { judgedOf, type CircuitContext } from './judged-entry';
import { gaugeBlock } from './reading-blocks';

type Working = Judgement['working'][number];

/** One observation as a column of the working: its name and what was worked out for it, if anything. */
interface WorkingColumn {
  readonly title: string;
  readonly typed: { readonly pressure: string; readonly temperature: string };
  readonly working: Working | undefined;
}

const SLIP_X = PAGE.left + 10;

/** Superheat of a coil: the value as left on its strip, how the valve behaved, and the whole working as a slip. */
export function superheatBlocks(circuit: CircuitContext, entry: FoldEntry): Block[] {
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'superheat') return [];
  const judged = judgedOf(entry);
  if (!judged) return [];
  const { answer } = content;
  // A result and how it was worked out are read together: they never stand on two pages.
  return kept([
    ...resultBlocks(circuit, answer, judged),
    gap(3),
    ...workingBlocks(circuit.context, columnsOf(circuit.context, answer, judged.working)),
  ]);
}

function resultBlocks(circuit: CircuitContext, answer: SuperheatAnswer, judged: Judgement): Block[] {
  const { sheet, words, format } = circuit.context;
  const figure = (label: string): number | null =>
    judged.figures.find((one) => one.label === label)?.value ?? null;
  const value = figure('superheat');
  if (value === null) return [];
  const low = figure('superheatLow');
  const high = figure('superheatHigh');
  const hunting = low !== null && high !== null ? { low, high } : null;
  const asFound = figure('superheatAsFound');
  const saturation = figure('saturation');
  const difference = (kelvins: number): string => format.ofDimension(kelvins, 'temperatureDifference');
  const facts = [
    answer.asLeft.valve === 'steady' || !hunting
      ? words.superheat.steady
      : words.superheat.hunting(difference(hunting.low), difference(hunting.high)),
    saturation === null ? '' : words.superheat.saturation(format.ofDimension(saturation, 'temperature')),
    asFound === null ? words.superheat.notAsFound : words.superheat.wasFound(difference(asFound)),
  ];
  const { limit } = judged;
  return kept([
    gaugeBlock(circuit, {
      figures: { value, low: limit?.low ?? null, high: limit?.high ?? null, hunting, asFound },
      dimension: 'temperatureDifference',
      isOutside: judged.outcome === 'outside',
    }),
    ...paragraph(sheet, facts.filter((fact) => fact !== '').join(' · '), STYLES.body),
  ]);
}

function columnsOf(
  context: DocumentContext,
  answer: SuperheatAnswer,
  workings: readonly Working[],
): WorkingColumn[] {
  const { words } = context;
  const left = observationColumns(context, answer.asLeft, words.superheat.asLeft);
  const found = answer.asFound ? observationColumns(context, answer.asFound, words.superheat.asFound) : [];
  // Judging writes the workings of the value as left first; an observation that couldn't be read has none at all.
  const hasLeft = workings.length >= left.length;
  const withWorking = (columns: readonly WorkingColumn[], from: number, present: boolean): WorkingColumn[] =>
    columns.map((column, index) => ({ ...column, working: present ? workings[from + index] : undefined }));
  return [
    ...withWorking(found, left.length, workings.length >= left.length + found.length),
    ...withWorking(left, 0, hasLeft),
  ];
}

function observationColumns(
  context: DocumentContext,
  observation: SuperheatObservation,
  name: string,
): WorkingColumn[] {
  const { words, format } = context;
  const pairs =
    observation.valve === 'steady'
      ? [{ title: name, pair: observation.pair }]
      : [
          { title: words.superheat.low(name), pair: observation.low },
          { title: words.superheat.high(name), pair: observation.high },
        ];
  return pairs.map(({ title, pair }) => ({
    title,
    typed: { pressure: format.typed(pair.pressure), temperature: format.typed(pair.temperature) },
    working: undefined,
  }));
}

function workingBlocks(context: DocumentContext, columns: readonly WorkingColumn[]): Block[] {
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
  const { words, format } = context;
  if (!reference) {
    return [
      [words.figures['suctionPressure'] ?? '', ...columns.map((column) => column.typed.pressure)],
      [words.figures['lineTemperature'] ?? '', ...columns.map((column) => column.typed.temperature)],
    ];
  }
  return reference.lines.map((line) => [
    words.figures[line.label] ?? spelledOut(line.label),
    ...columns.map((column) => {
      const own = column.working?.lines.find((candidate) => candidate.label === line.label);
      if (own) return format.quantity(own.value, own.unit);
      if (line.label === 'suctionPressure') return column.typed.pressure;
      return line.label === 'lineTemperature' ? column.typed.temperature : '—';
    }),
  ]);
}

function explanation(context: DocumentContext, working: Working): Block[] {
  const { sheet, words } = context;
  const formula = words.formulas[working.formula] ?? spelledOut(working.formula);
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
