import type { FoldEntry } from '#shared/sequences/fold';
import { reduceSamples } from '#shared/refrigeration/logger/reduce-samples';
import { gap, kept, type Block } from '../../pdf/block';
import { paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import { trendChart } from '../../pdf/trend-chart';
import type { StepOf } from '#shared/checklist/step';
import { judgedOf, type CircuitContext } from './judged-entry';
import { verdictBlocks } from './measurement-blocks';
import { workingBlocks } from './working-blocks';

/** More points than this are finer than a printed line. */
const MOST_POINTS = 900;

/** A log of temperatures: what came of it, the curve with its band, and the working. */
export function trendBlocks(circuit: CircuitContext, entry: FoldEntry, step: StepOf<'trend'>): Block[] {
  const { context } = circuit;
  const { sheet, words, format } = context;
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'trend') return [];
  const { answer } = content;
  const ordered = answer.atS
    .map((at, index) => ({ at, kelvins: answer.temperatureK[index] ?? NaN }))
    .filter(({ kelvins }) => Number.isFinite(kelvins))
    .sort((a, b) => a.at - b.at);
  const drawn = reduceSamples(
    Float64Array.from(ordered, ({ at }) => at),
    Float64Array.from(ordered, ({ kelvins }) => kelvins),
    MOST_POINTS,
  );
  const temperature = (kelvins: number): string => format.ofDimension(kelvins, 'temperature');
  const what = `${answer.column}, ${words.superheat.log(answer.file.name, answer.file.rows)}`;
  return [
    ...kept([
      ...verdictBlocks(circuit, entry),
      gap(3),
      trendChart(
        {
          times: [...drawn.times],
          values: [...drawn.values],
          low: step.bandLowK,
          high: step.bandHighK,
        },
        {
          highText: temperature(step.bandHighK),
          lowText: step.bandLowK === null ? '' : temperature(step.bandLowK),
          startText: answer.startText,
          endText: format.ofDimension((answer.atS.at(-1) ?? 0) - (answer.atS[0] ?? 0), 'duration'),
          alt: what,
        },
      ),
    ]),
    ...paragraph(sheet, what, STYLES.small),
    gap(3),
    ...(judgedOf(entry)?.working ?? []).flatMap((working) =>
      workingBlocks(context, [{ title: '', typed: {}, working }]),
    ),
  ];
}
