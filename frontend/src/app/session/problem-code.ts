/** A call that the server answered with an error, or didn't answer at all: then the status is 0. */
export interface HttpFailure {
  readonly status: number;
  readonly body: unknown;
}

/**
 * Tells a call that failed from every other error. It goes by the error's own name, because HTTP's classes stay in
 * `*-api.ts`.
 *
 * @returns `null` for anything but a failed call, which is then somebody else's to handle
 */
export function httpFailure(error: unknown): HttpFailure | null {
  if (typeof error !== 'object' || error === null || !('name' in error) || !('status' in error)) return null;
  if (error.name !== 'HttpErrorResponse' || typeof error.status !== 'number') return null;
  return { status: error.status, body: 'error' in error ? error.error : null };
}

/**
 * The `code` of a problem that the server answered with.
 *
 * @returns `null` for anything else: no network, a body that isn't a problem
 */
export function problemCode(error: unknown): string | null {
  const body = httpFailure(error)?.body;
  if (typeof body !== 'object' || body === null || !('code' in body)) return null;
  return typeof body.code === 'string' ? body.code : null;
}
