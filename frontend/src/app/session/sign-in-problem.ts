import { httpFailure, problemCode } from './problem-code';

/** The sentence for a sign-in that didn't work: what happened, and what to do. */
export function signInProblem(error: unknown): string {
  const code = problemCode(error);
  if (code === 'wrongCredentials') return 'session.wrongCredentials';
  if (code === 'tooManyTries') return 'session.tooManyTries';
  if (httpFailure(error)?.status === 0) return 'session.noNetwork';
  return 'session.serverTrouble';
}
