import { Bug } from './failure';

/**
 * Ends a `switch` over a closed set, so that a new member fails to compile.
 *
 * @throws {Bug} always, when data from outside the types gets here
 */
export function unreachable(value: never): never {
  throw new Bug(`Unexpected value: ${JSON.stringify(value)}`);
}
