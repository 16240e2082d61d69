import type { LogFile } from '#shared/checklist/kinds/trend';
import type { LoggerFile, LoggerRefusal, ReadLoggerOptions } from '#shared/refrigeration/logger/logger-file';

/** Why a file isn't read. `cannotOpen`: the phone doesn't give its bytes (any more). */
export type LogRefusal = LoggerRefusal | 'cannotOpen';

/** What came of one file. */
export type LogReading =
  | { readonly ok: true; readonly file: LogFile; readonly log: LoggerFile }
  | { readonly ok: false; readonly reason: LogRefusal };

/** How far the reading is: `share` from 0 to 1, and at the end what came of it. */
export type LogStage =
  | { readonly kind: 'reading'; readonly share: number }
  | { readonly kind: 'done'; readonly reading: LogReading };

/** What the page asks of the worker; the worker answers with `LogStage`s. */
export interface LogOrder {
  readonly file: File;
  readonly options: ReadLoggerOptions;
}
