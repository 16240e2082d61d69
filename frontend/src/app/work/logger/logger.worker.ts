import type { LogOrder, LogReading, LogStage } from './log-reading';
import { readLogFile } from './read-log-file';

/*
 * Reads one file away from the page, so that a phone answers taps meanwhile. The page ends the worker when it has the
 * columns or doesn't want them any more.
 */

/** The columns' memory changes hands instead of being copied. */
const memoryOf = (reading: LogReading): ArrayBuffer[] =>
  reading.ok
    ? [reading.log.times, ...reading.log.columns.map(({ values }) => values)].map(
        ({ buffer }) => buffer as ArrayBuffer,
      )
    : [];

const tell = (stage: LogStage, transfer: ArrayBuffer[] = []): void => postMessage(stage, { transfer });

addEventListener('message', ({ data }: MessageEvent<LogOrder>) => {
  readLogFile(data.file, data.options, (share) => tell({ kind: 'reading', share })).then(
    (reading) => tell({ kind: 'done', reading }, memoryOf(reading)),
    // A bug: thrown where the page hears of it as the worker's error.
    (error: unknown) => reportError(error),
  );
});
