import { TimeoutError } from 'rxjs';
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

/** The server's sentence about why, for the person who has to deal with it. */
export function refusalReason(error: unknown): string {
  const failure = httpFailure(error);
  if (!failure) return String(error);
  const { body } = failure;
  if (typeof body === 'object' && body !== null && 'detail' in body && typeof body.detail === 'string') {
    return body.detail;
  }
  return `HTTP ${failure.status}`;
}
