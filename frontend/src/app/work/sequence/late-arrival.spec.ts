import { describe, expect, it } from '@jest/globals';
import { lateArrival } from './late-arrival';
import { bodyOf, CONFIRMED, contentOf, storedOf } from './sequence.fixture';

const made = (deviceTime: string) => storedOf(1, bodyOf(1, contentOf('a', CONFIRMED), { deviceTime }));

describe('lateArrival', () => {
  it('is when it came, for an entry that was made long before', () => {
    expect(lateArrival(made('2026-03-02T08:40:00.000Z'))).toBe('2026-03-02T09:00:01.000Z');
  });

  it('is null for one that came at once', () => {
    expect(lateArrival(made('2026-03-02T08:59:00.000Z'))).toBeNull();
  });

  it('is null for one whose arrival is not known', () => {
    const { body } = made('2026-03-02T08:40:00.000Z');
    const server = { position: 0, standing: 'inOrder', judgement: null } as const;
    expect(lateArrival({ body, server, hash: null })).toBeNull();
  });
});
