import * as z from 'zod/mini';
import type { Remark } from '#shared/sequences/entry';
import type { Step } from '#shared/checklist/step';

/** Remarks as they are being written, by step key. */
export type Drafts = Readonly<Record<string, string>>;

const draftsSchema = z.record(z.string(), z.string());
const keyOf = (sequenceId: string): string => `remarks/${sequenceId}`;

/** What was written before this tab was reloaded: nothing typed is lost by that. */
export function restoreDrafts(storage: Storage, sequenceId: string): Drafts {
  const text = storage.getItem(keyOf(sequenceId));
  if (text === null) return {};
  const drafts = draftsSchema.safeParse(JSON.parse(text));
  return drafts.success ? drafts.data : {};
}

/** Keeps what is being written in this tab; empty drafts are not kept. */
export function keepDrafts(storage: Storage, sequenceId: string, drafts: Drafts): void {
  const written = Object.entries(drafts).filter(([, text]) => text !== '');
  if (written.length === 0) storage.removeItem(keyOf(sequenceId));
  else storage.setItem(keyOf(sequenceId), JSON.stringify(Object.fromEntries(written)));
}

/** The remarks to send back with, in working order: only steps that have one are reopened. */
export function remarksOf(drafts: Drafts, steps: readonly Step[]): Remark[] {
  return steps.flatMap(({ key }) => {
    const text = drafts[key]?.trim() ?? '';
    return text === '' ? [] : [{ stepKey: key, text }];
  });
}
