import type { FoldEntry } from '#shared/sequences/fold';
import { viewSequence, type SequenceView } from '#shared/sequences/sequence-view';
import type { RestsOn } from '#shared/sequences/entry';
import type { DeviceId } from '#shared/plant/ids';
import type { CachedSequence, OutboxEntry } from '../../offline/local-database';

/**
 * All entries of a sequence that this phone knows of: the server's in order of position, then its own unsent ones in
 * the order they were made. A refused one is not among them; it stands on its step as a problem.
 */
export function knownEntries(cached: CachedSequence, outbox: readonly OutboxEntry[]): readonly FoldEntry[] {
  const byId = new Map<string, FoldEntry>();
  for (const entry of [...cached.detail.entries, ...cached.acknowledged]) byId.set(entry.body.id, entry);
  const stored = [...byId.values()].sort((a, b) => a.server.position - b.server.position);
  const unsent = outbox
    .filter(
      (entry) => entry.state === 'waiting' && entry.sequenceId === cached.sequenceId && !byId.has(entry.id),
    )
    .sort(byMaking)
    .map((entry): FoldEntry => ({
      body: entry.body,
      server: { position: 0, standing: 'inOrder', judgement: entry.judgement },
      hash: null,
    }));
  return [...stored, ...unsent];
}

/** A device counts what it makes; between a device and the one that replaced it only the clock tells. */
function byMaking(a: OutboxEntry, b: OutboxEntry): number {
  if (a.deviceId === b.deviceId) return a.deviceCount - b.deviceCount;
  return a.body.deviceTime < b.body.deviceTime ? -1 : 1;
}

/** The state of a sequence as this phone sees it, sent or not. */
export function localView(cached: CachedSequence, outbox: readonly OutboxEntry[]): SequenceView {
  return viewSequence(cached.detail.stepList, knownEntries(cached, outbox));
}

/** What a submission made now rests on: of each device, the highest count up to which nothing is missing. */
export function restsOn(view: SequenceView): RestsOn[] {
  return Object.entries(view.fold.arrived)
    .map(([deviceId, arrived]) => ({ deviceId: deviceId as DeviceId, count: arrived.upTo }))
    .filter((rest) => rest.count > 0);
}

/** Whether an entry is only on this phone yet. */
export const isUnsent = (entry: FoldEntry): boolean => entry.hash === null;
