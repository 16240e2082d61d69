import { TimeoutError } from 'rxjs';
import type { EntryRefusal } from '#shared/contracts/sequences';
import { httpFailure, problemCode } from '../session/problem-code';

/**
 * What a call that failed means for what it carried. `later`: the network or the server, try again. `signIn`: nobody is
 * known to the server, a person has to sign in. `refused`: it will never be taken as it is.
 */
export type DeliveryFailure = 'later' | 'signIn' | 'refused';

const REFUSING_STATUS: ReadonlySet<number> = new Set([400, 404, 409, 413, 415, 422]);

/** Sorts a failed call. When in doubt it is `later`: waiting loses nothing. */
export function deliveryFailure(error: unknown): DeliveryFailure {
  const failure = httpFailure(error);
  if (error instanceof TimeoutError || !failure) return 'later';
  if (failure.status === 401) return 'signIn';
  if (failure.status === 403) return problemCode(error) === 'notAllowed' ? 'refused' : 'later';
  // Without a code of ours it was something on the way that answered, such as a proxy during an update.
  return REFUSING_STATUS.has(failure.status) && problemCode(error) !== null ? 'refused' : 'later';
}

/** Whether the server itself failed (5xx): the network is there, and what was sent may be what it fails on. */
export function isServerFailure(error: unknown): boolean {
  return (httpFailure(error)?.status ?? 0) >= 500;
}

/**
 * Why something recorded here was not taken, as kept on the phone: the server's answer about one entry, or the code of
 * the problem with which it turned a whole call down. Screens have the words.
 */
export type Refusal =
  EntryRefusal | { readonly code: 'callRefused'; readonly params: { readonly failure: string } };

/** Why a call was turned down, for the person who has to deal with it. */
export function refusalOf(error: unknown): Refusal {
  return { code: 'callRefused', params: { failure: problemCode(error) ?? 'unknown' } };
}
