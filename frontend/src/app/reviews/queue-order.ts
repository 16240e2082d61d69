import type { QueueItem } from '#shared/contracts/review-queue';

/** What has something outside comes first, then what has waited longest. */
export function orderQueue(items: readonly QueueItem[]): readonly QueueItem[] {
  return [...items].sort(
    (a, b) =>
      Number(b.outsideCount > 0) - Number(a.outsideCount > 0) ||
      Date.parse(a.submittedAt) - Date.parse(b.submittedAt) ||
      a.code.localeCompare(b.code, undefined, { numeric: true }),
  );
}

/** How many of the rows were not there before; none on the first reading. */
export function newSince(before: readonly QueueItem[] | null, now: readonly QueueItem[]): number {
  if (before === null) return 0;
  const known = new Set(before.map(({ sequenceId, round }) => `${sequenceId}/${round}`));
  return now.filter(({ sequenceId, round }) => !known.has(`${sequenceId}/${round}`)).length;
}
