import type { MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import type { Method, MethodField } from '#shared/checklist/methods/method';
import { METHODS } from '#shared/checklist/methods/methods';
import { VERDICT_WORDS } from '#shared/checklist/words/verdict-words';
import type { StepOf } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import { UNITS } from '#shared/units/unit';
import { gap, kept, type Block } from '../../pdf/block';
import { factGrid, type Fact } from '../../pdf/fact-grid';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { STYLES } from '../../pdf/text-style';
import { say, type DocumentContext } from './document-context';
import { judgedOf, type CircuitContext } from './judged-entry';
import { gaugeBlock } from './reading-blocks';
import { figureName, workingBlocks } from './working-blocks';

/** A measurement: what was typed, box by box, what came of it, and the whole working. */
export function measurementBlocks(
  circuit: CircuitContext,
  entry: FoldEntry,
  step: StepOf<'measurement'>,
): Block[] {
  const { context } = circuit;
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'measurement') return [];
  const { answer } = content;
  const method = METHODS[step.method];
  const typed = boxFacts(context, method.fields, answer);
  return [
    ...kept(verdictBlocks(circuit, entry)),
    gap(2),
    ...(typed.length > 0 ? [...factGrid(context.sheet, typed, 3), gap(3)] : []),
    ...(method.rows ? [...rowTable(context, method.rows, answer.rows), gap(3)] : []),
    ...(judgedOf(entry)?.working ?? []).flatMap((working) =>
      workingBlocks(context, [{ title: say(context, method.title), typed: {}, working }]),
    ),
  ];
}

/** What was concluded, with the figure it rests on and the others. */
export function verdictBlocks(circuit: CircuitContext, entry: FoldEntry): Block[] {
  const { context } = circuit;
  const judged = judgedOf(entry);
  if (!judged) return [];
  const said = (judged.verdicts ?? []).map((code) =>
    say(context, VERDICT_WORDS[code] ?? { en: code, es: code }),
  );
  const [main, ...others] = judged.figures;
  const gauge =
    main && judged.limit
      ? [
          gaugeBlock(circuit, {
            figures: {
              value: main.value,
              low: judged.limit.low,
              high: judged.limit.high,
              hunting: null,
              asFound: null,
            },
            dimension: UNITS[main.unit].dimension,
            isOutside: judged.outcome === 'outside',
          }),
        ]
      : [];
  const shown = gauge.length > 0 ? others : judged.figures;
  const figures = shown.map(
    ({ label, value, unit }) => `${figureName(context, label)} ${context.format.quantity(value, unit)}`,
  );
  return [
    ...said.flatMap((text) => paragraph(context.sheet, text, STYLES.strong)),
    ...gauge,
    ...(figures.length > 0 ? paragraph(context.sheet, figures.join(' · '), STYLES.body) : []),
  ];
}

/** What was typed row by row: readings of a vacuum, cylinders of a charge. */
function rowTable(
  context: DocumentContext,
  { label, fields }: NonNullable<Method['rows']>,
  rows: readonly MeasurementBoxes[],
): Block[] {
  if (rows.length === 0) return [];
  const columns = [
    { title: say(context, label), share: 10 },
    ...fields.map((field) => ({
      title: say(context, field.label),
      share: 20,
      ...(field.kind === 'quantity' ? { style: STYLES.mono } : {}),
    })),
  ];
  const cells = rows.map((row, index) => [
    { text: String(index + 1) },
    ...fields.map((field) => ({ text: boxText(context, field, row) })),
  ]);
  return ruledTable(context.sheet, columns, cells, { hasRowHeads: true, padding: 1.5 });
}

function boxFacts(
  context: DocumentContext,
  fields: readonly MethodField[],
  boxes: Pick<MeasurementBoxes, 'quantities' | 'words'>,
): Fact[] {
  return fields.flatMap((field): Fact[] => {
    const value = boxText(context, field, boxes);
    return value === '' ? [] : [{ label: say(context, field.label), value }];
  });
}

function boxText(
  context: DocumentContext,
  field: MethodField,
  { quantities, words }: Pick<MeasurementBoxes, 'quantities' | 'words'>,
): string {
  if (field.kind === 'quantity') {
    const typed = quantities[field.key];
    return typed ? context.format.typed(typed) : '';
  }
  const word = words[field.key] ?? '';
  if (field.kind === 'words') return word;
  const option = field.options.find((candidate) => candidate.value === word);
  return option ? say(context, option.label) : word;
}

/** A measurement in one line of words, for histories. */
export function summarizeMeasurement(circuit: CircuitContext, entry: FoldEntry): string {
  const { context } = circuit;
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'measurement') return '';
  const { answer } = content;
  const method = METHODS[answer.method];
  const typed = [...boxFacts(context, method.fields, answer)].map(({ label, value }) => `${label} ${value}`);
  const rows = answer.rows.map((row) =>
    boxFacts(context, method.rows?.fields ?? [], row)
      .map(({ value }) => value)
      .join(' '),
  );
  const said = (judgedOf(entry)?.verdicts ?? []).map((code) =>
    say(context, VERDICT_WORDS[code] ?? { en: code, es: code }),
  );
  return [...said, ...typed, ...rows].join('; ');
}
