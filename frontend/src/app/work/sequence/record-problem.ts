import type { StepKind } from '#shared/checklist/step';
import { DOUBT_WORDS } from '#shared/checklist/words/doubt-words';
import type { Language } from '#shared/checklist/text';
import type { StepView } from '#shared/sequences/sequence-view';
import type { StepDraft } from '../steps/step-draft';
import type { Reason } from './step-footer';

/**
 * Why an answer can't be recorded yet, in words beside the grey button.
 *
 * @returns `null` when it can, or nothing was said about it yet
 */
export function whyNot(
  kind: StepKind,
  draft: Pick<StepDraft, 'lacking' | 'refusals'>,
  standing: readonly StepView[],
  language: Language,
): Reason | null {
  const [override] = standing;
  if (kind === 'signature' && override?.step.kind === 'override')
    return { key: 'work.putBackFirst', params: { subject: override.step.subject[language] } };
  const [refusal] = draft.refusals();
  if (refusal) return { said: DOUBT_WORDS[refusal.kind][language] };
  const lacking = draft.lacking();
  return lacking && { key: `work.lacks_${lacking}`, params: {} };
}

/** Why recording itself failed, which only the phone can cause: a key of the words. */
export function failureKey(error: unknown): string {
  if (error instanceof DOMException && error.name === 'QuotaExceededError') return 'work.phoneFull';
  if (error instanceof Error && error.name === 'DomainFailure') return 'work.phoneUnknown';
  return 'work.couldNotStore';
}
