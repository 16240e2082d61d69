import { DomainFailure } from '#shared/failures/failure';
import type { Caller } from './define-route';

const FRESH_MS = 15 * 60_000;

/**
 * Signing needs a session whose password was given in the last 15 minutes (after 21 CFR 11.200(a)(1)).
 *
 * @throws {DomainFailure} passwordNeeded
 */
export function requireFreshPassword(caller: Caller): void {
  const age = caller.passwordGivenAt
    ? Date.now() - caller.passwordGivenAt.getTime()
    : Number.POSITIVE_INFINITY;
  if (age > FRESH_MS) throw new DomainFailure('passwordNeeded', 'Give your password again to sign.');
}
