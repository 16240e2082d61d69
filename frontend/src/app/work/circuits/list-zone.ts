import type { CircuitRow } from '#shared/contracts/openings';
import type { SequenceId } from '#shared/plant/ids';

type Row = Pick<CircuitRow, 'openingId' | 'sequenceId'>;

/**
 * The time zone on whose clock a list of circuits tells times: the store's, where all are of one store and a circuit of
 * it is on this phone; else the phone's own, which is then named beside the time as well.
 *
 * @param zoneOf the zone of a sequence that is on this phone; `null` for one that isn't
 * @param ownZone the phone's
 * @returns an IANA name
 */
export async function listZone(
  rows: readonly Row[],
  zoneOf: (id: SequenceId) => Promise<string | null>,
  ownZone: string,
): Promise<string> {
  if (new Set(rows.map(({ openingId }) => openingId)).size !== 1) return ownZone;
  for (const { sequenceId } of rows) {
    const zone = sequenceId && (await zoneOf(sequenceId));
    if (zone) return zone;
  }
  return ownZone;
}
