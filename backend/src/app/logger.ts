import { pino, type Logger } from 'pino';

/** What drivers hang on their errors: statements with values in them, among which are hashes of passwords and sessions. */
const SECRETS = ['parameters', 'query', 'sql', 'driverError', 'request', '$metadata'];

/** One JSON object a line. Errors keep their message, stack and code; what they carry of data is left out. */
export function createLogger(level: string, stream?: NodeJS.WritableStream): Logger {
  const options = { level, redact: { paths: SECRETS.map((name) => `err.${name}`), remove: true } };
  return stream ? pino(options, stream) : pino(options);
}
