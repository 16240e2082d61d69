import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import {
  hasNote,
  isCorrected,
  isHunting,
  isRecordedAgain,
  lacksAsFound,
  photosUsedTwice,
  stepsWithLate,
} from './attention-facts';
import { photosNotWell, photosOf, type PhotoStatus } from './photo-states';

/** Why a step needs a lead's eyes before the others; in the order in which they are looked at. */
export const REASONS = [
  'outside',
  'liquidRisk',
  'stale',
  'recordedAgain',
  'doubt',
  'answeredTwice',
  'photoBroken',
  'photoAwaited',
  'photoTwice',
  'hunting',
  'noAsFound',
  'notApplicable',
  'late',
  'note',
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

/** What a step is looked at against: facts of the whole sequence. */
export interface Surroundings {
  readonly photos: readonly PhotoStatus[];
  /** Position of the review that sent it back; 0 in a first round. */
  readonly sentBackAt: number;
  readonly usedTwice: ReadonlySet<string>;
  readonly withLate: ReadonlySet<string>;
}

/** Every step once: those that need eyes first, the gravest on top; then the rest in working order. */
export function orderForReview(
  view: Pick<SequenceView, 'steps' | 'late'>,
  photos: readonly PhotoStatus[],
  sentBackAt: number,
): ReviewOrder {
  const around: Surroundings = {
    photos,
    sentBackAt,
    usedTwice: photosUsedTwice(view.steps),
    withLate: stepsWithLate(view.late),
  };
  const steps = view.steps.map((step, index): ReviewStep => ({
    view: step,
    number: index + 1,
    reasons: reasonsOf(step, around),
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

/** Why this step needs eyes; empty for one that was answered once, plainly, and lies within. */
export function reasonsOf(step: StepView, around: Surroundings): readonly Reason[] {
  const { current, fold } = step;
  const doubts = current?.server.judgement?.doubts ?? [];
  const notWell = photosNotWell(current, around.photos);
  const isAgain = isRecordedAgain(step, around.sentBackAt);
  const holds: Readonly<Record<Reason, boolean>> = {
    outside: fold?.outcome === 'outside',
    liquidRisk: doubts.some(({ kind }) => kind === 'liquidRisk'),
    stale: step.again === 'stale',
    recordedAgain: isAgain,
    // The first half of a test that goes on is no doubt.
    doubt: doubts.some(({ kind }) => kind !== 'liquidRisk' && kind !== 'incomplete'),
    answeredTwice: fold?.answeredTwice ?? false,
    photoBroken: notWell.some(({ state }) => state === 'broken'),
    photoAwaited: notWell.some(({ state }) => state === 'awaited'),
    photoTwice: photosOf(current).some((hash) => around.usedTwice.has(hash)),
    hunting: isHunting(current),
    noAsFound: lacksAsFound(current),
    notApplicable: fold?.outcome === 'notApplicable',
    late: around.withLate.has(step.step.key),
    note: hasNote(current),
    // Said once: what was recorded again since it was sent back has been corrected, too.
    corrected: !isAgain && isCorrected(step),
  };
  return REASONS.filter((reason) => holds[reason]);
}

/** The reasons that an answer's own outcome mark doesn't say already. */
export function reasonsBesideOutcome(reasons: readonly Reason[]): readonly Reason[] {
  return reasons.filter((reason) => reason !== 'outside' && reason !== 'notApplicable');
}
