import type { Step } from '../checklist/step';
import type { EntryBody, EntryContent } from './entry';
import type { FoldState, StepFold } from './fold-state';

/** A moment by the clock of one device. Clocks of two devices are never compared: they may be hours apart. */
export type DeviceMoment = NonNullable<StepFold['readAt']>;

/** ISO times as times: written with more or fewer digits they don't sort as text. */
const compare = (a: string, b: string): number => Date.parse(a) - Date.parse(b);

type AnswerContent = Extract<EntryContent, { kind: 'answer' }>;

/** When an entry was recorded. */
export const momentOf = (body: EntryBody): DeviceMoment => ({ deviceId: body.deviceId, at: body.deviceTime });

/**
 * When an answer says that the circuit runs otherwise than before: the last turn of a valve, or the recording of a step
 * (or option) that the template marks so, such as a regulator that was set.
 *
 * @returns `null` when nothing changed
 */
export function changeOf(
  body: EntryBody,
  { stepKey, answer }: AnswerContent,
  steps: readonly Step[],
): DeviceMoment | null {
  if (answer.kind === 'superheat') {
    const last = (answer.turns ?? []).toSorted((a, b) => compare(a.at, b.at)).at(-1);
    return last === undefined ? null : { deviceId: body.deviceId, at: last.at };
  }
  const step = steps.find((candidate) => candidate.key === stepKey);
  if (!step || step.kind !== answer.kind) return null;
  const changes =
    step.kind === 'choose' && answer.kind === 'choose'
      ? step.options.find((option) => option.value === answer.value)?.changes
      : 'changes' in step && step.changes;
  return changes ? momentOf(body) : null;
}

/**
 * The superheats that a change makes stale: valves of one circuit feel each other, so a reading from before it says
 * nothing any more. On one device its clock decides; what another device read counts as before, because it was in the
 * chain before.
 *
 * @param ownKey the step that the change was recorded on: its own reading came after its own turns
 */
export function staleSteps(
  state: FoldState,
  ownKey: string,
  change: DeviceMoment,
  steps: readonly Step[],
): string[] {
  return steps
    .filter((step) => step.kind === 'superheat' && step.key !== ownKey)
    .map((step) => step.key)
    .filter((key) => {
      const fold = state.steps[key];
      if (!fold?.counts || fold.reopenedBy !== null || !fold.readAt) return false;
      return fold.readAt.deviceId !== change.deviceId || compare(fold.readAt.at, change.at) < 0;
    });
}
