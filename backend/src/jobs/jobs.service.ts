import type * as z from 'zod/mini';
import type { jobListSchema } from '#shared/contracts/health';
import type { Context, Transactions } from '../database/transactions';
import type { JobKind, JobPayloads } from './job-kinds';
import type { JobsRepository } from './jobs.repository';

/** Enqueues jobs in the transaction of their cause, and shows them to admins. */
export class JobsService {
  private nudge: () => void = () => undefined;

  constructor(
    private readonly transactions: Transactions,
    private readonly jobs: JobsRepository,
  ) {}

  /** Called once by the wiring: what to wake after a commit. */
  onEnqueued(nudge: () => void): void {
    this.nudge = nudge;
  }

  async enqueue<K extends JobKind>(
    context: Context,
    companyId: string,
    kind: K,
    uniqueKey: string,
    payload: JobPayloads[K],
  ): Promise<void> {
    await this.jobs.insert(context, companyId, kind, uniqueKey, payload);
    context.afterCommit.push(() => this.nudge());
  }

  async list(
    companyId: string,
    limit: number,
    after: string | undefined,
  ): Promise<z.infer<typeof jobListSchema>> {
    const [createdAt, id] = (after ?? '').split('_');
    const before = createdAt && id ? { createdAt: new Date(createdAt), id } : null;
    const rows = await this.jobs.list(this.transactions.outside, companyId, limit, before);
    const last = rows.at(-1);
    return {
      items: rows.map((row) => ({
        id: row.id,
        kind: row.kind,
        state: row.state,
        attempts: row.attempts,
        createdAt: row.createdAt.toISOString(),
        runAfter: row.runAfter.toISOString(),
        lastError: row.lastError,
      })),
      next: rows.length === limit ? (last ? `${last.createdAt.toISOString()}_${last.id}` : null) : null,
    };
  }
}
