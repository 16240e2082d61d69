import type { DataSource, EntityManager } from 'typeorm';
import { TemporaryFailure } from '#shared/failures/failure';

const DEADLOCK = 1213;
const LOCK_WAIT = 1205;
const MAX_TRIES = 4;

const managers = new WeakMap<Context, EntityManager>();

/**
 * Where a repository's statement runs: inside a transaction or outside of any. Opaque on purpose: services pass it on
 * and can't get at the ORM through it.
 */
export class Context {
  /** Work to be done once the transaction has been committed, such as waking the job worker. */
  readonly afterCommit: (() => void)[] = [];

  constructor(manager: EntityManager) {
    managers.set(this, manager);
  }
}

/** The entity manager behind a context; for repositories only. */
export function managerOf(context: Context): EntityManager {
  return managers.get(context) as EntityManager;
}

/**
 * The one way to run a transaction. A deadlock or a lock wait (also what a Galera cluster answers when two nodes
 * collide) is tried again from the start, so `work` must have no effect outside the database.
 */
export class Transactions {
  /** For statements that need no transaction. */
  readonly outside: Context;

  constructor(private readonly dataSource: DataSource) {
    this.outside = new Context(dataSource.manager);
  }

  /**
   * Runs `work` in a transaction.
   *
   * @param isolation `READ COMMITTED` for queues: the database's own level locks the gaps between rows too, and workers
   *   would wait for each other where they are meant to step over
   * @throws {TemporaryFailure} when the database refused it for its locks again and again
   */
  async run<T>(work: (context: Context) => Promise<T>, isolation?: 'READ COMMITTED'): Promise<T> {
    for (let attempt = 1; ; attempt += 1) {
      try {
        const attemptWork = async (manager: EntityManager) => {
          const inside = new Context(manager);
          return { context: inside, result: await work(inside) };
        };
        const { context, result } = await (isolation
          ? this.dataSource.transaction(isolation, attemptWork)
          : this.dataSource.transaction(attemptWork));
        for (const action of context.afterCommit) action();
        return result;
      } catch (error) {
        if (!isLockError(error)) throw error;
        if (attempt === MAX_TRIES) throw new TemporaryFailure('The database is busy', 2, { cause: error });
        // Two that collided must not come back in step.
        await new Promise((resolve) => setTimeout(resolve, attempt * 10 + Math.random() * 30));
      }
    }
  }
}

function isLockError(error: unknown): boolean {
  const errno = driverErrno(error);
  return errno === DEADLOCK || errno === LOCK_WAIT;
}

/** The driver's error number behind an ORM error, or `undefined`. */
export function driverErrno(error: unknown): number | undefined {
  const source =
    (error as { driverError?: { errno?: unknown } } | null)?.driverError ?? (error as { errno?: unknown });
  return typeof source?.errno === 'number' ? source.errno : undefined;
}

/** Whether a unique key refused an insert (ER_DUP_ENTRY). */
export function isDuplicate(error: unknown): boolean {
  return driverErrno(error) === 1062;
}
