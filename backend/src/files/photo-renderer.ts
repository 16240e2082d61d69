import { join } from 'node:path';
import { Piscina } from 'piscina';
import type { PhotoRenditions } from './photo-worker';

/** Photos are decoded in worker threads; at most two, since each takes about half a gigabyte on a 12-megapixel picture. */
export class PhotoRenderer {
  private readonly pool = new Piscina({
    filename: join(__dirname, 'photo-worker.js'),
    minThreads: 0,
    maxThreads: 2,
    idleTimeout: 20_000,
    maxQueue: 64,
  });

  async render(bytes: Buffer, signal: AbortSignal): Promise<PhotoRenditions> {
    return this.pool.run(bytes, { signal }) as Promise<PhotoRenditions>;
  }

  async close(): Promise<void> {
    await this.pool.destroy();
  }
}
