import type { Judgement } from '#shared/checklist/judgement';
import type { Answer, StepKind } from '#shared/checklist/step';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';

/**
 * What a step's sheet does. `ask`: it takes an answer. `standing`: an override was set here; putting it back is a button
 * of its own, so that the one big button never means the opposite of what it just meant. `recorded`: it shows what
 * stands there.
 */
export type SheetMode = 'ask' | 'standing' | 'recorded';

/** @param isCorrecting whether somebody asked for a correction of what is recorded */
export function sheetMode(view: StepView, isCorrecting: boolean, isClosed: boolean): SheetMode {
  if (isClosed) return 'recorded';
  if (view.step.kind === 'override' && view.fold?.overrideStanding) return 'standing';
  return showsRecorded(view, isCorrecting) ? 'recorded' : 'ask';
}

/** Why an answer that can be recorded deserves a second look first: the end of a key of the words. */
export type SecondLook = 'outside' | 'finding' | 'doubt' | 'keep' | 'preliminary' | 'unsettled';

/**
 * @param isUnsettled whether a valve hasn't had its wait since it was turned last
 * @returns `null` when it is recorded at once
 */
export function secondLook(
  kind: StepKind,
  judgement: Judgement | null,
  isUnsettled = false,
): SecondLook | null {
  if (!judgement) return null;
  const kept = judgement.doubts.filter((doubt) => doubt.severity === 'keep');
  if (kept.some((doubt) => doubt.kind === 'preliminary')) return 'preliminary';
  if (kept.length > 0) return 'keep';
  if (isUnsettled) return 'unsettled';
  if (judgement.outcome === 'outside') return kind === 'choose' ? 'finding' : 'outside';
  return judgement.doubts.some((doubt) => doubt.severity === 'ask') ? 'doubt' : null;
}

/**
 * The words on a step's one big button, as a key.
 *
 * @param isSecondLook whether the question about an odd answer was shown: recording it is then said to be on purpose
 */
export function actionKey(kind: StepKind, mode: SheetMode, isSecondLook: boolean): string {
  if (mode !== 'ask') return 'work.nextOpen';
  return isSecondLook ? 'work.action_asTyped' : `work.action_${kind}`;
}

/** Whether the step shows what was recorded, rather than asking: it is done, and nobody asked for a correction. */
export function showsRecorded(view: StepView, isCorrecting: boolean): boolean {
  if (isCorrecting || !view.current) return false;
  return !!view.fold && view.fold.counts && view.fold.reopenedBy === null && !view.fold.overrideStanding;
}

/**
 * What a step's boxes start from. A correction starts from what was recorded; a step that a lead asks for again starts
 * empty, or last week's number would be recorded twice.
 */
export function startingAnswer(view: StepView): Answer | null {
  const content = view.current?.body.content;
  if (content?.kind !== 'answer') return null;
  return view.fold?.reopenedBy ? null : content.answer;
}

/** The overrides that stand on a sequence: all that has to be put back before anybody signs. */
export function standingOverrides(view: SequenceView): readonly StepView[] {
  return view.steps.filter((step) => step.step.kind === 'override' && step.fold?.overrideStanding);
}
