import { Piscina } from 'piscina';
import type { PhotoFinding } from './photo-worker';

/** Photos are decoded in worker threads; at most two, since each takes about half a gigabyte on a 12-megapixel picture. */
export class PhotoRenderer {
  private readonly pool: Piscina;

  /** @param workerFile the compiled photo-worker.js: a worker thread can't be started from a source file */
  constructor(workerFile: string) {
    this.pool = new Piscina({
      filename: workerFile,
      minThreads: 0,
      maxThreads: 2,
      idleTimeout: 20_000,
      maxQueue: 64,
    });
  }

  async render(bytes: Buffer, signal: AbortSignal): Promise<PhotoFinding> {
    return this.pool.run(bytes, { signal }) as Promise<PhotoFinding>;
  }

  async close(): Promise<void> {
    await this.pool.destroy();
  }
}
