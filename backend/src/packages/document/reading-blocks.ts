import type { StepOf } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import type { Dimension } from '#shared/units/unit';
import { gap, type Block } from '../../pdf/block';
import { COLOURS } from '../../pdf/colours';
import { PAGE } from '../../pdf/page-geometry';
import { baselineOf, paragraph } from '../../pdf/paragraph';
import { drawStrip, STRIP_HEIGHT } from '../../pdf/strip';
import type { StripFigures } from '../../pdf/strip-scale';
import { STYLES } from '../../pdf/text-style';
import { judgedOf, type CircuitContext } from './judged-entry';

const STRIP_X = PAGE.left + 176;

export interface Gauge {
  readonly figures: StripFigures;
  readonly dimension: Dimension;
  readonly isOutside: boolean;
}

/** A figure set large with its limits below, and the strip beside it where there are limits. */
export function gaugeBlock(circuit: CircuitContext, gauge: Gauge): Block {
  const { format, words } = circuit.context;
  const { figures, dimension, isOutside } = gauge;
  const number = format.ofDimension(figures.value, dimension);
  const range = format.range(figures.low, figures.high, dimension);
  return {
    height: range === '' ? STYLES.reading.lead + 6 : STRIP_HEIGHT + 6,
    draw: (sheet, top) => {
      const style = isOutside ? { ...STYLES.reading, colour: COLOURS.plum } : STYLES.reading;
      const room = STRIP_X - PAGE.left - 12;
      sheet.tagged('P', () => {
        sheet.text(sheet.fitted(number, style, room), PAGE.left, baselineOf(top + 2, style), style);
        if (range === '') return;
        const limits = `${words.limits.label}: ${range}`;
        const fits = sheet.width(limits, STYLES.small) <= room;
        sheet.text(
          fits ? limits : sheet.fitted(range, STYLES.small, room),
          PAGE.left,
          top + 33,
          STYLES.small,
        );
      });
      if (range === '') return;
      sheet.artifact(() =>
        drawStrip(sheet, figures, {
          x: STRIP_X,
          top,
          width: PAGE.right - STRIP_X - 20,
          isOutside,
          lowText: figures.low === null ? '' : format.ofDimension(figures.low, dimension),
          highText: figures.high === null ? '' : format.ofDimension(figures.high, dimension),
        }),
      );
    },
  };
}

/** One reading: its value in the opening's units, its limits, and how it was typed where that looks different. */
export function readingBlocks(circuit: CircuitContext, entry: FoldEntry, step: StepOf<'reading'>): Block[] {
  const { sheet, words, format } = circuit.context;
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'reading') return [];
  const judged = judgedOf(entry);
  const typed = format.typed(content.answer.value);
  const figure = judged?.figures.find((candidate) => candidate.label === 'value');
  if (!figure) return [...paragraph(sheet, typed, STYLES.reading), gap(2)];
  const limit = judged?.limit;
  const blocks = [
    gaugeBlock(circuit, {
      figures: {
        value: figure.value,
        low: limit?.low ?? null,
        high: limit?.high ?? null,
        hunting: null,
        asFound: null,
      },
      dimension: step.dimension,
      isOutside: judged?.outcome === 'outside',
    }),
  ];
  if (!format.showsAsTyped(content.answer.value)) {
    blocks.push(...paragraph(sheet, words.entered(typed), STYLES.small));
  }
  return blocks;
}
