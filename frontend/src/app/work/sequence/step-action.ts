import type { Answer } from '#shared/checklist/step';
import type { StepView } from '#shared/sequences/sequence-view';

/**
 * The words on a step's one big button, as a key.
 *
 * @param hasQuestion whether something about the answer looks odd and was shown: recording it is then said to be on
 * purpose
 */
export function actionKey(view: StepView, hasQuestion: boolean): string {
  if (hasQuestion) return 'work.action_asTyped';
  if (view.step.kind !== 'override') return `work.action_${view.step.kind}`;
  return view.fold?.overrideStanding ? 'work.action_putBack' : 'work.action_set';
}

/** Whether the step shows what was recorded, rather than asking: it is done, and nobody asked for a correction. */
export function showsRecorded(view: StepView, isCorrecting: boolean): boolean {
  if (isCorrecting || !view.current) return false;
  return !!view.fold && view.fold.counts && view.fold.reopenedBy === null && !view.fold.overrideStanding;
}

/**
 * What a step's boxes start from. A correction starts from what was recorded; a step that a lead asks for again starts
 * empty, or last week's number would be recorded twice. Whether an override stands is known either way.
 */
export function startingAnswer(view: StepView): Answer | null {
  const content = view.current?.body.content;
  if (content?.kind !== 'answer') return null;
  return view.fold?.reopenedBy && view.step.kind !== 'override' ? null : content.answer;
}
