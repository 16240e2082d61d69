/**
 * Something that the person at the terminal can act on: printed as a plain sentence, without a stack.
 * Every other error is a bug of the scripts and keeps its stack.
 */
export class ScriptFailure extends Error {
  /** @param {string} message one sentence that says what to do */
  constructor(message) {
    super(message);
    this.name = 'ScriptFailure';
  }
}

/**
 * The text to print for an error.
 * @param {unknown} error
 * @returns {string}
 */
export function describeFailure(error) {
  if (error instanceof ScriptFailure) {
    return error.message;
  }
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
