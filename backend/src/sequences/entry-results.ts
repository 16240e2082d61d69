import type { EntryRefusal, EntryResult } from '#shared/contracts/sequences';
import type { ServerPart } from '#shared/sequences/entry';
import type { SequenceState } from '#shared/sequences/transitions';
import type { EntryEntity } from './entry.entity';

/** What the device is told of an entry that is in the chain. */
export function storedResult(
  result: 'stored' | 'alreadyStored',
  row: Pick<EntryEntity, 'id' | 'hash'>,
  server: ServerPart,
  state: SequenceState,
): EntryResult {
  return {
    result,
    id: row.id,
    position: server.position,
    standing: server.standing,
    judgement: server.judgement,
    hash: row.hash,
    state,
  };
}

/** Why the server refuses an entry. */
export type RefusalCode = Exclude<EntryRefusal['code'], 'unknown'>;

const MESSAGES: Readonly<Record<RefusalCode, string>> = {
  notAnEntry: 'It is not an entry as documented.',
  changedOnTheWay: 'Its content does not match its hash: it was changed on the way.',
  otherAuthor: 'It was recorded by somebody else than who sends it.',
  serverOnly: 'Only the server makes entries of this kind.',
  unknownDevice: 'It names a device that is not registered for who sends it.',
  idTaken: 'Another entry has this id already.',
  noSuchSequence: 'There is no such sequence for you.',
  twiceInBatch: 'It stands twice in this batch.',
};

/** What the device is told of an entry that isn't taken: a code for its screen, a sentence for other clients. */
export function refusedResult(
  id: string | null,
  code: RefusalCode,
  params: EntryRefusal['params'] = {},
): EntryResult {
  const place = params.path === undefined ? '' : ` See ${params.path}.`;
  return { result: 'refused', id, reason: { code, params }, message: `${MESSAGES[code]}${place}` };
}
