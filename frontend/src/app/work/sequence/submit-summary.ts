import type { Step } from '#shared/checklist/step';
import type { Text } from '#shared/checklist/text';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import { chosenLabel, judgedFigure, type JudgedFigure } from '../../ui/answer-view/answer-figures';

/** Why a step stands in the way of a submission: the end of a key of the words. */
export type MissingReason = 'standing' | 'askedAgain' | 'notCounting' | 'open';

/** The reason why a step is missing; a standing override comes first, because it is dangerous to forget. */
export function reasonMissing(view: SequenceView, stepKey: string): MissingReason {
  const fold = view.fold.steps[stepKey];
  if (fold?.overrideStanding) return 'standing';
  if (fold && fold.reopenedBy !== null) return 'askedAgain';
  return fold && !fold.counts ? 'notCounting' : 'open';
}

/** A step that lies outside, with what lies outside: a value and its limits, or what was found. */
export interface OutsideRow {
  readonly step: Step;
  readonly figure: JudgedFigure | null;
  readonly finding: Text | null;
}

export function outsideRow({ step, current }: StepView): OutsideRow {
  const content = current?.body.content;
  const answer = content?.kind === 'answer' ? content.answer : null;
  return {
    step,
    figure: judgedFigure(current?.server.judgement ?? null),
    finding: answer?.kind === 'choose' ? chosenLabel(step, answer.value) : null,
  };
}
