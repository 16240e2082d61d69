import type { PhotoStatus } from './photo-states';
import { photosNotWell } from './photo-states';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';

/** Why a step needs a lead's eyes before the others; in the order in which they are looked at. */
export const REASONS = [
  'outside',
  'liquidRisk',
  'answeredTwice',
  'photoBroken',
  'photoAwaited',
  'notApplicable',
  'doubt',
  'corrected',
] as const;
export type Reason = (typeof REASONS)[number];

/** One step on the reviewer's list. */
export interface ReviewStep {
  readonly view: StepView;
  /** Place in the working order, from 1: what people say on the phone ("step 14"). */
  readonly number: number;
  readonly reasons: readonly Reason[];
}

export interface ReviewOrder {
  readonly first: readonly ReviewStep[];
  readonly rest: readonly ReviewStep[];
}

/** Every step once: those that need eyes first, the gravest on top; then the rest in working order. */
export function orderForReview(view: SequenceView, photos: readonly PhotoStatus[]): ReviewOrder {
  const steps = view.steps.map((step, index): ReviewStep => ({
    view: step,
    number: index + 1,
    reasons: reasonsOf(step, photos),
  }));
  const gravest = ({ reasons }: ReviewStep): number =>
    reasons[0] ? REASONS.indexOf(reasons[0]) : REASONS.length;
  return {
    first: steps
      .filter(({ reasons }) => reasons.length > 0)
      .sort((a, b) => gravest(a) - gravest(b) || a.number - b.number),
    rest: steps.filter(({ reasons }) => reasons.length === 0),
  };
}

/** Why this step needs eyes; empty for one that was answered once and lies within. */
export function reasonsOf(step: StepView, photos: readonly PhotoStatus[]): readonly Reason[] {
  const doubts = step.current?.server.judgement?.doubts ?? [];
  const notWell = photosNotWell(step.current, photos);
  const holds: Readonly<Record<Reason, boolean>> = {
    outside: step.fold?.outcome === 'outside',
    liquidRisk: doubts.some(({ kind }) => kind === 'liquidRisk'),
    answeredTwice: step.fold?.answeredTwice ?? false,
    photoBroken: notWell.some(({ state }) => state === 'broken'),
    photoAwaited: notWell.some(({ state }) => state === 'awaited'),
    notApplicable: step.fold?.outcome === 'notApplicable',
    doubt: doubts.some(({ kind }) => kind !== 'liquidRisk'),
    corrected: isCorrected(step),
  };
  return REASONS.filter((reason) => holds[reason]);
}

/** Whether an answer was given again. Putting an override back is the second half of the work, not a correction. */
function isCorrected({ step, history }: StepView): boolean {
  return history.length > (step.kind === 'override' ? 2 : 1);
}
