import type { StoredEntry } from '#shared/sequences/entry';
import type { FoldEntry } from '#shared/sequences/fold';
import type { StepView } from '#shared/sequences/sequence-view';
import { photosOf } from './photo-states';

/** What an answer's recording alone says that a lead wants to look at, each fact by itself. */

function answerOf(entry: FoldEntry | null) {
  const content = entry?.body.content;
  return content?.kind === 'answer' ? content.answer : null;
}

/**
 * Position of the review that the evidence on the table answers to: the last that sent it back.
 *
 * @returns 0 in a first round
 */
export function lastSentBack(entries: readonly Pick<StoredEntry, 'body' | 'server'>[]): number {
  const reviews = entries.filter(
    ({ body }) => body.content.kind === 'review' && body.content.verdict === 'sentBack',
  );
  return reviews.at(-1)?.server.position ?? 0;
}

/** Whether a step was recorded again after it was sent back. */
export function isRecordedAgain({ current, history }: StepView, sentBackAt: number): boolean {
  return sentBackAt > 0 && history.length > 1 && current !== null && current.server.position > sentBackAt;
}

/** Whether an answer was given again. Putting an override back is the second half of the work, not a correction. */
export function isCorrected({ step, history }: Pick<StepView, 'step' | 'history'>): boolean {
  return history.length > (step.kind === 'override' ? 2 : 1);
}

/** Whether the valve was left hunting: its superheat is the middle of two, which deserves a look however it is judged. */
export function isHunting(entry: FoldEntry | null): boolean {
  const answer = answerOf(entry);
  if (answer?.kind !== 'superheat') return false;
  const shown = entry?.server.judgement?.verdicts ?? [];
  return answer.asLeft.valve === 'hunting' || shown.includes('superheat_hunts');
}

/** Whether nobody took the superheat before the valve was touched. */
export function lacksAsFound(entry: FoldEntry | null): boolean {
  const answer = answerOf(entry);
  return answer?.kind === 'superheat' && answer.asFound === null;
}

/** Whether the installer wrote something for people to read. */
export function hasNote(entry: FoldEntry | null): boolean {
  const answer = answerOf(entry);
  return answer?.kind === 'note' && answer.text.trim() !== '';
}

/** Hashes of photos that stand as evidence on more than one step: one picture can hardly show both. */
export function photosUsedTwice(steps: readonly StepView[]): ReadonlySet<string> {
  const seen = new Set<string>();
  const twice = new Set<string>();
  for (const { current } of steps) {
    for (const hash of new Set(photosOf(current))) {
      if (seen.has(hash)) twice.add(hash);
      seen.add(hash);
    }
  }
  return twice;
}

/** Keys of the steps on which something arrived after an approval. */
export function stepsWithLate(late: readonly FoldEntry[]): ReadonlySet<string> {
  return new Set(
    late.flatMap(({ body: { content } }) =>
      content.kind === 'answer' || content.kind === 'notApplicable' ? [content.stepKey] : [],
    ),
  );
}

/**
 * Which round of review this is, or was: one more than the reviews given before the last submission. An approval isn't
 * another round of itself.
 */
export function reviewedRound(entries: readonly Pick<StoredEntry, 'body' | 'server'>[]): number {
  const submitted = entries.findLastIndex(
    ({ body, server }) => body.content.kind === 'submission' && server.standing === 'inOrder',
  );
  const before = submitted === -1 ? entries : entries.slice(0, submitted);
  return (
    1 +
    before.filter(({ body }) => body.content.kind === 'review' && body.content.verdict !== 'withdrawn').length
  );
}
