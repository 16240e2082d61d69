import { describe, expect, it } from '@jest/globals';
import type { OpeningSummary } from '#shared/contracts/openings';
import { orderOpenings } from './opening-order';

const opening = (name: string, openingDate: string): OpeningSummary =>
  ({ name, openingDate }) as unknown as OpeningSummary;

describe('orderOpenings', () => {
  it('puts the soonest ahead on top and those behind at the end, the latest first', () => {
    const openings = [
      opening('past', '2026-01-02'),
      opening('later', '2026-05-01'),
      opening('today', '2026-03-01'),
      opening('just past', '2026-02-27'),
    ];
    expect(orderOpenings(openings, '2026-03-01').map(({ name }) => name)).toEqual([
      'today',
      'later',
      'just past',
      'past',
    ]);
  });

  it('does not change what it is given', () => {
    const openings = [opening('b', '2026-05-01'), opening('a', '2026-04-01')];
    orderOpenings(openings, '2026-03-01');
    expect(openings.map(({ name }) => name)).toEqual(['b', 'a']);
  });
});
