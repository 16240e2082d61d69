import { describe, expect, it } from '@jest/globals';
import type { QueueItem } from '#shared/contracts/review-queue';
import { newSince, orderQueue } from './queue-order';

const item = (code: string, submittedAt: string, outsideCount = 0): QueueItem =>
  ({ code, sequenceId: code, round: 1, submittedAt, outsideCount }) as unknown as QueueItem;

describe('orderQueue', () => {
  it('puts what is outside first, each group with the oldest on top', () => {
    const items = [
      item('A1', '2026-03-01T10:00:00Z'),
      item('A2', '2026-03-01T12:00:00Z', 1),
      item('A3', '2026-03-01T08:00:00Z'),
      item('A4', '2026-03-01T09:00:00Z', 3),
    ];
    expect(orderQueue(items).map(({ code }) => code)).toEqual(['A4', 'A2', 'A3', 'A1']);
  });

  it('orders circuits submitted together as people count', () => {
    const at = '2026-03-01T10:00:00Z';
    expect(orderQueue([item('A10', at), item('A9', at)]).map(({ code }) => code)).toEqual(['A9', 'A10']);
  });
});

describe('newSince', () => {
  const first = item('A1', '2026-03-01T10:00:00Z');

  it('is none on the first reading', () => {
    expect(newSince(null, [first])).toBe(0);
  });

  it('counts new circuits, and those that come again in a later round', () => {
    expect(newSince([first], [first, item('A2', '2026-03-01T11:00:00Z')])).toBe(1);
    expect(newSince([first], [{ ...first, round: 2 }])).toBe(1);
    expect(newSince([first], [])).toBe(0);
  });
});
