import { problemCodeOf } from '../problem-of';

/**
 * Does what needs a fresh password: when the server asks for it, the person is asked once and the call is made again.
 *
 * @param ask shows the password dialog; `false` when the person turned back
 * @throws what the call failed with, also when the person turned back
 */
export async function withPassword<T>(call: () => Promise<T>, ask: () => Promise<boolean>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (problemCodeOf(error) !== 'passwordNeeded' || !(await ask())) throw error;
    return call();
  }
}
