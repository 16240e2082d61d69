import type { Language } from '#shared/checklist/text';
import type { Step } from '#shared/checklist/step';
import type { SequenceView } from '#shared/sequences/sequence-view';
import { formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { chosenLabel, judgedFigure } from '../ui/answer-view/answer-figures';

/** A step outside its limits, with what was found there. */
export interface OutsideStep {
  readonly step: Step;
  readonly number: number;
  readonly value: string;
}

/** What an approval covers although it lies outside: each step with its value, in working order. */
export function outsideSteps(
  view: Pick<SequenceView, 'steps'>,
  unitSystem: UnitSystem,
  language: Language,
): readonly OutsideStep[] {
  return view.steps.flatMap(({ step, fold, current }, index) => {
    if (fold?.outcome !== 'outside') return [];
    const figure = judgedFigure(current?.server.judgement ?? null);
    const content = current?.body.content;
    const answer = content?.kind === 'answer' ? content.answer : null;
    const value = figure
      ? formatQuantity(figure.value, displayUnit(figure.dimension, unitSystem), language)
      : answer?.kind === 'choose'
        ? chosenLabel(step, answer.value)[language]
        : answer?.kind === 'reading'
          ? `${answer.value.text} ${UNITS[answer.value.unit].symbol}`.trim()
          : '';
    return [{ step, number: index + 1, value }];
  });
}
