import { describeFailure } from './failure.mjs';
import { endRunningTools } from './processes.mjs';

/**
 * Under `npm start` one Ctrl-C arrives twice, from the terminal and from npm. What follows sooner than a
 * person can press again is the same one.
 */
const ECHO_MS = 1000;

/** Thrown through the start when a person asked to stop in the middle of it. */
export class Interrupted extends Error {}

/**
 * Ends everything in the right order. Parts are noted in the order of their start and stopped in the
 * opposite one, so the database is the last to go and nobody loses it while working.
 */
export class Shutdown {
  /** @param {(line: string) => void} log */
  constructor(log) {
    this.log = log;
    this.isRequested = false;
    this.heardAt = -Infinity;
    /** @type {import('./lock.mjs').Lock | undefined} the lock on the data directory, once it is held */
    this.lock = undefined;
    /** @type {{ name: string, stop: () => Promise<void> | void, kill?: () => void }[]} */
    this.parts = [];
    /** Resolves when a person asks to stop. */
    this.requested = new Promise((resolve) => {
      this.resolveRequested = resolve;
    });
  }

  /** Listens for Ctrl-C and kill. The first asks to stop, the second ends everything at once. */
  listen() {
    for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
      process.on(signal, () => this.hear());
    }
  }

  hear() {
    const now = performance.now();
    if (!this.isRequested) {
      this.heardAt = now;
      this.request();
    } else if (now - this.heardAt > ECHO_MS) {
      this.killAll();
    }
  }

  request() {
    this.isRequested = true;
    this.log('\nStopping … (Ctrl-C again ends everything at once)');
    endRunningTools();
    this.resolveRequested?.(undefined);
  }

  /** Leaves the start between two of its steps. */
  check() {
    if (this.isRequested) {
      throw new Interrupted();
    }
  }

  /**
   * @param {string} name
   * @param {() => Promise<void> | void} stop
   * @param {() => void} [kill] for parts that are processes of their own
   */
  add(name, stop, kill) {
    this.parts.push({ name, stop, kill });
  }

  /** Stops all parts; one that fails to stop doesn't keep the others from it. */
  async stopAll() {
    for (const part of [...this.parts].reverse()) {
      try {
        await part.stop();
      } catch (error) {
        this.log(`  ${part.name} did not stop cleanly: ${describeFailure(error)}`);
      }
    }
    this.parts = [];
  }

  killAll() {
    endRunningTools('SIGKILL');
    for (const part of this.parts) {
      part.kill?.();
    }
    process.exit(1);
  }
}
