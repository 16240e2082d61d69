import { problemSchema, type Problem } from '#shared/contracts/problem';

/** What went wrong, as far as a screen has to tell it apart. `offline`: nobody answered at all. */
export type ProblemCode = Problem['code'] | 'offline' | 'unknown';

/**
 * The server's problem document behind an error, looking through wrappers.
 *
 * @param error whatever a call ended with
 * @returns `null` when the server said nothing that we understand (no network, a proxy's page, a bug here)
 */
export function problemOf(error: unknown): Problem | null {
  const parsed = problemSchema.safeParse(field(error, 'error'));
  if (parsed.success) return parsed.data;
  const cause = field(error, 'cause');
  return cause === undefined ? null : problemOf(cause);
}

/** The one word for an error that screens translate (`ui.failure_<code>`). */
export function problemCodeOf(error: unknown): ProblemCode {
  const problem = problemOf(error);
  if (problem) return problem.code;
  const status = field(error, 'status') ?? field(field(error, 'cause'), 'status');
  if (status === 0) return 'offline';
  if (status === 502 || status === 503 || status === 504) return 'temporary';
  return status === 404 ? 'notFound' : 'unknown';
}

/** Whether trying the same thing again may help without anybody changing anything. */
export function isWorthRetrying(code: ProblemCode): boolean {
  return (
    code === 'offline' ||
    code === 'temporary' ||
    code === 'unknown' ||
    code === 'bug' ||
    code === 'tooManyTries'
  );
}

function field(value: unknown, name: string): unknown {
  return typeof value === 'object' && value !== null ? (value as Record<string, unknown>)[name] : undefined;
}
