import type { EntryResult } from '#shared/contracts/sequences';
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
