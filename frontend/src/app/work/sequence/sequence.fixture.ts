import type { Judgement } from '#shared/checklist/judgement';
import { plainJudgement } from '#shared/checklist/judgement';
import type { Answer, Step, StepList } from '#shared/checklist/step';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { DeviceId, EntryId, PersonId, SequenceId } from '#shared/plant/ids';
import type { EntryBody, EntryContent, StoredEntry } from '#shared/sequences/entry';
import type { CachedSequence, OutboxEntry } from '../../offline/local-database';

/** A UUID that says nothing but its number. */
export const uuid = (number: number): string => `01920000-0000-7000-8000-${String(number).padStart(12, '0')}`;

export const ME = uuid(1) as PersonId;
export const PHONE = uuid(2) as DeviceId;
export const SEQUENCE = uuid(3) as SequenceId;
const HASH = 'a'.repeat(64);

export function confirmStep(key: string, more: Partial<Step> = {}): Step {
  const title = { en: key, es: key };
  return {
    kind: 'confirm',
    key,
    section: 'one',
    title,
    instruction: null,
    caution: null,
    fixtureId: null,
    coilId: null,
    required: true,
    source: null,
    ...more,
  } as Step;
}

export function stepListOf(steps: Step[]): StepList {
  const title = { en: 'Title', es: 'Título' };
  return {
    format: 1,
    template: { key: 'circuit', version: 1, title },
    facts: { refrigerant: 'R-448A', atmospherePaAbs: 101_325, elevationM: 0, unitSystem: 'us' },
    sections: [{ key: 'one', title }],
    steps,
  };
}

export function contentOf(
  stepKey: string,
  answer: Answer,
  judgement: Judgement = plainJudgement('recorded'),
): EntryContent {
  const { outcome, counts, figures } = judgement;
  return { kind: 'answer', stepKey, answer, workedOut: { outcome, counts, figures } };
}

export function bodyOf(number: number, content: EntryContent, more: Partial<EntryBody> = {}): EntryBody {
  return {
    format: 1,
    id: uuid(100 + number) as EntryId,
    sequenceId: SEQUENCE,
    authorId: ME,
    deviceId: PHONE,
    deviceCount: number,
    countOnSequence: number,
    deviceTime: '2026-03-02T09:00:00.000Z',
    stepListHash: null,
    supersedes: null,
    content,
    ...more,
  };
}

export function storedOf(position: number, body: EntryBody, judgement: Judgement | null = null): StoredEntry {
  const server = {
    position,
    standing: 'inOrder' as const,
    receivedAt: '2026-03-02T09:00:01.000Z',
    judgement,
    judgingVersion: 1,
  };
  // Without `stateAfter` the fold works out what each entry does, which spares these specs from saying it.
  return { body, bodyHash: HASH, server: server as StoredEntry['server'], previousHash: HASH, hash: HASH };
}

export function waitingOf(body: EntryBody, more: Partial<OutboxEntry> = {}): OutboxEntry {
  const { id, sequenceId, deviceCount } = body;
  return {
    id,
    deviceId: PHONE,
    sequenceId,
    deviceCount,
    body,
    bodyHash: HASH,
    judgement: plainJudgement('recorded'),
    state: 'waiting',
    reason: null,
    ...more,
  };
}

/** Only what the phone reads of a sequence; the specification plays no part in it. */
export function cachedOf(steps: Step[], entries: StoredEntry[]): CachedSequence {
  const detail = { id: SEQUENCE, stepList: stepListOf(steps), entries } as unknown as SequenceDetail;
  return { personId: ME, sequenceId: SEQUENCE, detail, acknowledged: [], readAt: '2026-03-02T09:00:00.000Z' };
}

export const CONFIRMED: Answer = { kind: 'confirm', confirmed: true };
