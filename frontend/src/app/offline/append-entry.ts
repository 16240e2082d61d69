import type { Judgement } from '#shared/checklist/judgement';
import type { DeviceId, EntryId, PersonId, SequenceId } from '#shared/plant/ids';
import { bodyHash } from '#shared/sequences/chain';
import type { EntryBody, EntryContent } from '#shared/sequences/entry';
import type { IDBPDatabase } from 'idb';
import type { FirstcoldSchema, OutboxEntry } from './local-database';

/** What an entry is made of, before it has its counts. */
export interface NewEntry {
  readonly id: EntryId;
  readonly sequenceId: SequenceId;
  readonly authorId: PersonId;
  readonly deviceId: DeviceId;
  /** The highest count that the server said it has of this device. */
  readonly serverLastCount: number;
  readonly deviceTime: string;
  readonly stepListHash: string | null;
  readonly supersedes: EntryId | null;
  readonly content: EntryContent;
  readonly judgement: Judgement | null;
}

const deviceKey = (deviceId: DeviceId): string => `device:${deviceId}`;
const sequenceKey = (deviceId: DeviceId, sequenceId: SequenceId): string =>
  `sequence:${deviceId}:${sequenceId}`;

/**
 * Gives an entry its counts, hashes it and puts it in the outbox, all in one transaction: two tabs never give out the
 * same count, and a count is never spent on an entry that isn't there. Photos that it names leave their draft state in
 * the same transaction.
 *
 * @throws {DOMException} named QuotaExceededError when the phone is full; nothing is stored then
 */
export async function appendEntry(
  database: IDBPDatabase<FirstcoldSchema>,
  fresh: NewEntry,
): Promise<OutboxEntry> {
  const { deviceId, sequenceId, authorId } = fresh;
  const transaction = database.transaction(['outbox', 'meta', 'sequences', 'photos'], 'readwrite');
  const meta = transaction.objectStore('meta');
  const cached = await transaction.objectStore('sequences').get([authorId, sequenceId]);
  const onServer = highestOnSequence(cached?.detail.entries.map((entry) => entry.body) ?? [], deviceId);
  const deviceCount =
    Math.max((await meta.get(deviceKey(deviceId))) ?? 0, fresh.serverLastCount, onServer.device) + 1;
  const given = (await meta.get(sequenceKey(deviceId, sequenceId))) ?? 0;
  const countOnSequence = Math.max(given, onServer.sequence) + 1;
  await meta.put(deviceCount, deviceKey(deviceId));
  await meta.put(countOnSequence, sequenceKey(deviceId, sequenceId));
  const entry = outboxEntry(fresh, deviceCount, countOnSequence);
  await transaction.objectStore('outbox').add(entry);
  for (const sha256 of photosOf(fresh.content)) {
    const photos = transaction.objectStore('photos');
    const photo = await photos.get([sequenceId, sha256]);
    if (photo?.state === 'draft')
      await photos.put({ ...photo, state: 'waiting', changedAt: fresh.deviceTime });
  }
  await transaction.done;
  return entry;
}

function outboxEntry(fresh: NewEntry, deviceCount: number, countOnSequence: number): OutboxEntry {
  const { id, sequenceId, authorId, deviceId, deviceTime, stepListHash, supersedes, content, judgement } =
    fresh;
  const body: EntryBody = {
    format: 1,
    id,
    sequenceId,
    authorId,
    deviceId,
    deviceCount,
    countOnSequence,
    deviceTime,
    stepListHash,
    supersedes,
    content,
  };
  return {
    id,
    deviceId,
    sequenceId,
    deviceCount,
    body,
    bodyHash: bodyHash(body),
    judgement,
    state: 'waiting',
    reason: null,
  };
}

function highestOnSequence(
  bodies: readonly EntryBody[],
  deviceId: DeviceId,
): { device: number; sequence: number } {
  const own = bodies.filter((body) => body.deviceId === deviceId);
  return {
    device: Math.max(0, ...own.map((body) => body.deviceCount)),
    sequence: Math.max(0, ...own.map((body) => body.countOnSequence)),
  };
}

/** The hashes of the photos that an entry names. */
export function photosOf(content: EntryContent): readonly string[] {
  if (content.kind !== 'answer' || content.answer.kind !== 'photo') return [];
  return content.answer.photos.map((photo) => photo.sha256);
}
