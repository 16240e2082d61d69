import type { FoldEntry } from '#shared/sequences/fold';

const LATE_MS = 10 * 60_000;

/**
 * When an entry reached the server, if that was more than ten minutes after it was made: it was made without a network
 * (or the phone's clock is wrong; the two times beside each other tell).
 *
 * @returns `null` for one that came at once, or isn't known to have come yet
 */
export function lateArrival(entry: FoldEntry): string | null {
  if (!('receivedAt' in entry.server) || typeof entry.server.receivedAt !== 'string') return null;
  const { receivedAt } = entry.server;
  return Math.abs(Date.parse(receivedAt) - Date.parse(entry.body.deviceTime)) > LATE_MS ? receivedAt : null;
}
