import { describe, expect, it } from '@jest/globals';
import type { CircuitRow } from '#shared/contracts/openings';
import { listZone } from './list-zone';

const row = (openingId: string, sequenceId: string | null) =>
  ({ openingId, sequenceId }) as unknown as CircuitRow;
const onPhone = async (id: string) => (id === 'kept' ? 'America/Denver' : null);
const OWN = 'America/New_York';

describe('listZone', () => {
  it('is the store’s, as soon as one of its circuits is on this phone', async () => {
    const rows = [row('one', null), row('one', 'far'), row('one', 'kept')];
    expect(await listZone(rows, onPhone, OWN)).toBe('America/Denver');
  });

  it('is the phone’s own where the circuits are of several stores', async () => {
    expect(await listZone([row('one', 'kept'), row('two', 'far')], onPhone, OWN)).toBe(OWN);
  });

  it.each([[[]], [[row('one', 'far')]]])('is the phone’s own where nothing is known yet', async (rows) => {
    expect(await listZone(rows, onPhone, OWN)).toBe(OWN);
  });
});
