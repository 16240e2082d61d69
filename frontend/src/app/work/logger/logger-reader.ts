import { Injectable } from '@angular/core';
import { catchError, defer, from, Observable, of, switchMap } from 'rxjs';
import type { ReadLoggerOptions } from '#shared/refrigeration/logger/logger-file';
import type { LogOrder, LogStage } from './log-reading';
import { readLogFile } from './read-log-file';

/** Reads logger files beside the page's own work. */
@Injectable({ providedIn: 'root' })
export class LoggerReader {
  /**
   * Reads a file in a worker; on the page itself where there is none, or no network to load it from.
   *
   * @param options what a person said where the file doesn't
   * @returns how far it is, then what came of it, then the end; whoever stops listening cancels the reading
   */
  read(file: File, options: ReadLoggerOptions = {}): Observable<LogStage> {
    return defer(() => (typeof Worker === 'undefined' ? of(null) : from(workerOrNull()))).pipe(
      switchMap((worker) => (worker ? inWorker(worker, { file, options }) : onPage({ file, options }))),
    );
  }
}

/** `null` when the worker's own code can't be loaded. */
async function workerOrNull(): Promise<Worker | null> {
  try {
    const { startLoggerWorker } = await import('./start-worker');
    return startLoggerWorker();
  } catch {
    return null;
  }
}

/** Nothing was heard of the worker before it failed: its file isn't there. */
class WorkerMissing extends Error {
  override readonly name = 'WorkerMissing';
}

function inWorker(worker: Worker, order: LogOrder): Observable<LogStage> {
  return new Observable<LogStage>((listener) => {
    let isHeard = false;
    worker.onmessage = ({ data }: MessageEvent<LogStage>) => {
      isHeard = true;
      listener.next(data);
      if (data.kind === 'done') listener.complete();
    };
    worker.onerror = (event) =>
      listener.error(isHeard ? new Error(event.message || 'The worker failed') : new WorkerMissing());
    worker.postMessage(order);
    return () => worker.terminate();
  }).pipe(
    catchError((error: unknown) => {
      if (error instanceof WorkerMissing) return onPage(order);
      throw error;
    }),
  );
}

function onPage({ file, options }: LogOrder): Observable<LogStage> {
  return new Observable((listener) => {
    readLogFile(file, options, (share) => listener.next({ kind: 'reading', share })).then(
      (reading) => {
        listener.next({ kind: 'done', reading });
        listener.complete();
      },
      (error: unknown) => listener.error(error),
    );
  });
}
