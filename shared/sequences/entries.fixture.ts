import type { Answer, Step } from '../checklist/step';
import { buildStep, SEA_LEVEL } from '../checklist/step.fixture';
import { judge } from '../checklist/judge';
import type { DeviceId, EntryId, PersonId, SequenceId } from '../plant/ids';
import type { EntryBody, EntryContent, Standing } from './entry';
import type { FoldEntry } from './fold';

// Entries as phones and the server make them, with ids that can be read in a failure's message.

const id = (kind: number, number: number) =>
  `00000000-0000-4000-8${String(kind).padStart(3, '0')}-${String(number).padStart(12, '0')}`;

export const SEQUENCE = id(1, 1) as SequenceId;
export const personId = (number: number) => id(2, number) as PersonId;
export const deviceId = (number: number) => id(3, number) as DeviceId;
export const entryId = (number: number) => id(4, number) as EntryId;
/** A head's hash that can be read: the position in front of zeros. */
export const hashOf = (number: number) => String(number).padStart(64, '0');

export const CONFIRM: Answer = { kind: 'confirm', confirmed: true };
export const confirmStep = (key: string, change: Partial<Extract<Step, { kind: 'confirm' }>> = {}) =>
  buildStep('confirm', { key, ...change });
export const noteStep = (key: string) => buildStep('note', { key });
export const overrideStep = (key: string) => buildStep('override', { key });
export const override = (phase: 'set' | 'putBack'): Answer => ({ kind: 'override', phase, remark: '' });

/** The one who makes all entries of a story: numbers them, and keeps each device's counts. */
export class Story {
  private entries = 0;
  private readonly counts = new Map<number, number>();

  constructor(private readonly steps: readonly Step[]) {}

  answer(
    device: number,
    key: string,
    answer: Answer = CONFIRM,
    supersedes: EntryId | null = null,
  ): FoldEntry {
    const step = this.steps.find((candidate) => candidate.key === key) ?? confirmStep(key);
    const judgement = judge(step, answer, SEA_LEVEL);
    const { outcome, counts, figures } = judgement;
    const workedOut = { outcome, counts, figures };
    const entry = this.make(device, { kind: 'answer', stepKey: key, answer, workedOut }, supersedes);
    return { ...entry, server: { ...entry.server, judgement } };
  }

  notApplicable(device: number, key: string): FoldEntry {
    return this.make(device, { kind: 'notApplicable', stepKey: key, reason: 'no such fan' });
  }

  /** Rests on everything that the named devices have recorded so far, or on what is said. */
  submission(device: number, restsOn?: readonly (readonly [number, number])[]): FoldEntry {
    const rests = restsOn ?? [[device, this.counts.get(device) ?? 0]];
    return this.make(device, {
      kind: 'submission',
      restsOn: rests.map(([number, count]) => ({ deviceId: deviceId(number), count })),
    });
  }

  expansion(stepListHash: string, changedSteps: readonly string[] = []): FoldEntry {
    return this.make(null, {
      kind: 'expansion',
      templateKey: 'circuit',
      templateVersion: 1,
      specificationRevision: 1,
      stepListHash,
      changedSteps: [...changedSteps],
    });
  }

  review(
    verdict: 'approved' | 'sentBack' | 'withdrawn',
    headHash: string,
    remarkedKeys: readonly string[] = [],
  ): FoldEntry {
    const remarks = remarkedKeys.map((stepKey) => ({ stepKey, text: `Again: ${stepKey}` }));
    return this.make(null, { kind: 'review', verdict, headHash, remarks, signature: null, meaning: null });
  }

  private make(device: number | null, content: EntryContent, supersedes: EntryId | null = null): FoldEntry {
    this.entries += 1;
    const count = device === null ? 0 : (this.counts.get(device) ?? 0) + 1;
    if (device !== null) this.counts.set(device, count);
    const body: EntryBody = {
      format: 1,
      id: entryId(this.entries),
      sequenceId: SEQUENCE,
      authorId: personId(device ?? 99),
      deviceId: device === null ? null : deviceId(device),
      deviceCount: count,
      countOnSequence: count,
      deviceTime: '2027-01-15T12:00:00.000Z',
      stepListHash: null,
      supersedes,
      content,
    };
    return { body, server: { position: 0, standing: 'inOrder', judgement: null }, hash: null };
  }
}

/** The entries as the server stored them, one after the other, with readable hashes. */
export function stored(entries: readonly FoldEntry[], from = 1): FoldEntry[] {
  return entries.map((entry, index) => ({
    ...entry,
    server: { ...entry.server, position: from + index },
    hash: hashOf(from + index),
  }));
}

export const standing = (entry: FoldEntry, value: Standing): FoldEntry => ({
  ...entry,
  server: { ...entry.server, standing: value },
});

/** Freezes a value and everything in it, so that changing it throws. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null) {
    Object.freeze(value);
    for (const part of Object.values(value)) deepFreeze(part);
  }
  return value;
}
