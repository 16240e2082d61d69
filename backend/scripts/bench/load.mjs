import { Worker } from 'node:worker_threads';
import { ScriptFailure } from '../failure.mjs';

/**
 * @typedef {object} LoadResult
 * @property {number} seconds
 * @property {number} requests
 * @property {number} perSecond requests
 * @property {number} p50Ms
 * @property {number} p99Ms
 * @property {boolean} ranDry whether the prepared requests were used up before the time was over
 */

/** The load generator as the other parts see it: one order at a time, answered when it is done. */
export class Load {
  /** @param {readonly import('./phones.mjs').PlannedInstaller[]} phones one connection each */
  constructor(phones) {
    this.connections = phones.length;
    this.worker = new Worker(new URL('./load-worker.mjs', import.meta.url), { workerData: { phones } });
  }

  /**
   * @param {string} name of the target
   * @param {number} port
   * @param {number} device which of the installers' devices; each counts its own entries
   */
  async open(name, port, device) {
    await this.#order({ kind: 'open', name, port, device });
  }

  /**
   * @param {{ name: string, path: string, batch: number, requests: number, durationMs: number }} order
   *   `requests` are prepared before the clock starts, over all connections
   * @returns {Promise<LoadResult>}
   */
  async run(order) {
    return this.#order({ kind: 'run', ...order });
  }

  async close() {
    await this.worker.terminate();
  }

  /**
   * @template Result what the generator answers to this kind of order
   * @param {object} order
   * @returns {Promise<Result>}
   */
  #order(order) {
    return new Promise((resolve, reject) => {
      const settle = (/** @type {() => void} */ how) => {
        this.worker.off('message', answered).off('error', broken).off('exit', ended);
        how();
      };
      const answered = (/** @type {{ result: Result, failure?: string }} */ { result, failure }) =>
        settle(() => (failure === undefined ? resolve(result) : reject(new ScriptFailure(failure))));
      const broken = (/** @type {Error} */ error) => settle(() => reject(error));
      const ended = () => settle(() => reject(new ScriptFailure('The load generator ended.')));
      this.worker.on('message', answered).on('error', broken).on('exit', ended);
      this.worker.postMessage(order);
    });
  }
}
