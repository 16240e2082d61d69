/** What a person can act on. Everything that is not one of these is a bug and is shown as such. */
export const FAILURE_CODES = [
  'invalidInput',
  'notSignedIn',
  'wrongCredentials',
  'passwordNeeded',
  'notAllowed',
  'notFound',
  'fourEyes',
  'wrongState',
  'changedMeanwhile',
  'alreadyThere',
  'tooLarge',
  'notAnImage',
  'notATable',
  'scheduleRefused',
  'templateRefused',
  'nothingToHandOver',
  'tooManyTries',
  'requestForged',
] as const;

export type FailureCode = (typeof FAILURE_CODES)[number];

/**
 * One place in the input and what is wrong there; `path` is a field path such as `entries.0.body`, by which screens have
 * words of their own. `message` is English, for logs and for clients without words.
 */
export interface FailurePlace {
  readonly path: string;
  readonly message: string;
}

/**
 * Something a person can put right. `message` is one plain English sentence for logs and for clients without a
 * translation; screens translate `code`.
 */
export class DomainFailure extends Error {
  override readonly name = 'DomainFailure';

  constructor(
    readonly code: FailureCode,
    message: string,
    readonly places: readonly FailurePlace[] = [],
    /** Further typed facts for the client, such as the two states of a refused move. */
    readonly facts: Readonly<Record<string, unknown>> = {},
  ) {
    super(message);
  }
}

/** Something that is likely to work when tried again: a lost connection, a store that restarts. */
export class TemporaryFailure extends Error {
  override readonly name = 'TemporaryFailure';

  constructor(
    message: string,
    readonly retryAfterS = 5,
    options?: { cause?: unknown },
  ) {
    super(message, options as undefined);
  }
}

/** A state that the program's own rules exclude; never caught, always logged. */
export class Bug extends Error {
  override readonly name = 'Bug';
}
