import type { OpeningSummary } from '#shared/contracts/openings';

/** Openings still ahead first, the soonest on top; then those that are open, the latest on top. */
export function orderOpenings(openings: readonly OpeningSummary[], today: string): readonly OpeningSummary[] {
  return [...openings].sort((a, b) => {
    const aIsAhead = a.openingDate >= today;
    const bIsAhead = b.openingDate >= today;
    if (aIsAhead !== bIsAhead) return aIsAhead ? -1 : 1;
    const byDate = a.openingDate.localeCompare(b.openingDate);
    return (aIsAhead ? byDate : -byDate) || a.name.localeCompare(b.name);
  });
}
