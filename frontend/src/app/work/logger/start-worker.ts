// By the name `Worker` the build finds the worker's file and bundles it.
import { TrustedWorker as Worker } from '../../ui/trusted-worker/trusted-worker';

/** Starts the worker that reads logger files. In a file of its own, which only a browser with workers loads. */
export const startLoggerWorker = (): Worker =>
  new Worker(new URL('./logger.worker', import.meta.url), { type: 'module' });
