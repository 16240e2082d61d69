import type { Judgement } from '../checklist/judgement';
import type { EntryId } from '../plant/ids';
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
 * (or option) that the template marked so on that day, such as a regulator that was set. Neither the steps that are
 * asked today nor their marks have a say: whoever folds the history later has others.
 *
 * @returns `null` when nothing changed
 */
export function changeOf(
  body: EntryBody,
  { answer }: AnswerContent,
  judgement: Judgement | null,
): DeviceMoment | null {
  if (answer.kind === 'superheat') {
    const last = (answer.turns ?? []).toSorted((a, b) => compare(a.at, b.at)).at(-1);
    return last === undefined ? null : { deviceId: body.deviceId, at: last.at };
  }
  return judgement?.changes ? momentOf(body) : null;
}

/**
 * The superheats that a change makes stale: valves of one circuit feel each other, so a reading from before it says
 * nothing any more. On one device its clock decides; what another device read counts as before, because it was in the
 * chain before.
 *
 * @param ownKey the step that the change was recorded on: its own reading came after its own turns
 */
export function staleSteps(state: FoldState, ownKey: string, change: DeviceMoment): string[] {
  return Object.entries(state.steps)
    .filter(([key, fold]) => {
      if (key === ownKey || !fold.counts || fold.reopenedBy !== null || !fold.readAt) return false;
      return fold.readAt.deviceId !== change.deviceId || compare(fold.readAt.at, change.at) < 0;
    })
    .map(([key]) => key);
}

/**
 * What makes a superheat stale the moment that it arrives: a change on the same device, recorded after it was read and
 * delivered before it.
 *
 * @returns the change's entry, or `null`
 */
export function overtakenBy(state: FoldState, ownKey: string, read: DeviceMoment): EntryId | null {
  const last = state.changedAt?.[read.deviceId ?? ''];
  if (!last || last.stepKey === ownKey) return null;
  return compare(read.at, last.at) < 0 ? last.entryId : null;
}
