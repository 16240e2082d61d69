import { uuidv7 } from 'uuidv7';
import { managerOf, type Context } from '../database/transactions';
import { JobEntity } from './job.entity';
import { JOB_RULES, type JobKind, type JobPayloads } from './job-kinds';

export interface ClaimedJob {
  readonly id: string;
  readonly companyId: string;
  readonly kind: JobKind;
  readonly payload: unknown;
  readonly attempts: number;
  /** Its workers died with it as often as it may be tried: it is only to be put in order, not tried again. */
  readonly isAbandoned: boolean;
}

interface JobRow {
  readonly id: string;
  readonly company_id: string;
  readonly kind: JobKind;
  readonly payload: string;
  readonly attempts: number;
}

async function lockFirst(context: Context, kind: JobKind, due: string): Promise<JobRow | undefined> {
  const rows: JobRow[] = await managerOf(context).query(
    `SELECT id, company_id, kind, payload, attempts FROM job FORCE INDEX (IX_job_due)
      WHERE kind = ? AND ${due} ORDER BY run_after LIMIT 1 FOR UPDATE SKIP LOCKED`,
    [kind],
  );
  return rows[0];
}

export class JobsRepository {
  /** Writes a job in the transaction that causes it. The same key twice is one job. */
  async insert<K extends JobKind>(
    context: Context,
    companyId: string,
    kind: K,
    uniqueKey: string,
    payload: JobPayloads[K],
  ): Promise<void> {
    await managerOf(context).query(
      `INSERT INTO job (id, company_id, kind, unique_key, payload, state, attempts, progress, created_at, run_after)
       VALUES (?, ?, ?, ?, ?, 'waiting', 0, 0, UTC_TIMESTAMP(3), UTC_TIMESTAMP(3))
       ON DUPLICATE KEY UPDATE id = id`,
      [uuidv7(), companyId, kind, uniqueKey, JSON.stringify(payload)],
    );
  }

  /**
   * Claims the next due job of a kind: one that waits, or one whose worker has gone silent. Other workers' rows are skipped, not
   * waited for; the claim is committed before the work begins.
   */
  async claim(context: Context, kind: JobKind): Promise<ClaimedJob | null> {
    // Two statements: one with OR sorts, and then locks every row that it looked at, not only the one it returns.
    const row =
      (await lockFirst(context, kind, "state = 'waiting' AND run_after <= UTC_TIMESTAMP(3)")) ??
      (await lockFirst(context, kind, "state = 'running' AND lease_until < UTC_TIMESTAMP(3)"));
    if (!row) return null;
    // A job whose worker dies with it every time must not go on for ever.
    const isAbandoned = row.attempts >= JOB_RULES[row.kind].maxAttempts;
    const attempts = isAbandoned ? row.attempts : row.attempts + 1;
    await managerOf(context).query(
      `UPDATE job SET state = 'running', attempts = ?,
              lease_until = UTC_TIMESTAMP(3) + INTERVAL ? SECOND WHERE id = ?`,
      [attempts, JOB_RULES[row.kind].leaseS, row.id],
    );
    return {
      id: row.id,
      companyId: row.company_id,
      kind: row.kind,
      payload: JSON.parse(row.payload),
      attempts,
      isAbandoned,
    };
  }

  /** Says that the worker is alive and how far it is. */
  async renew(context: Context, id: string, kind: JobKind, progress: number): Promise<void> {
    await managerOf(context).query(
      `UPDATE job SET progress = ?, lease_until = UTC_TIMESTAMP(3) + INTERVAL ? SECOND WHERE id = ? AND state = 'running'`,
      [progress, JOB_RULES[kind].leaseS, id],
    );
  }

  async finish(context: Context, id: string): Promise<void> {
    await managerOf(context).update(
      JobEntity,
      { id },
      { state: 'done', progress: 1, leaseUntil: null, lastError: null },
    );
  }

  /** Puts a job back that was only interrupted by an orderly end: it hasn't used up a try. */
  async giveBack(context: Context, id: string): Promise<void> {
    await managerOf(context).query(
      `UPDATE job SET state = 'waiting', lease_until = NULL, attempts = attempts - 1, run_after = UTC_TIMESTAMP(3)
        WHERE id = ? AND state = 'running'`,
      [id],
    );
  }

  /** Puts a job that failed back for later, or gives it up. */
  async fail(context: Context, id: string, error: string, retryAfterS: number | null): Promise<void> {
    await managerOf(context).query(
      `UPDATE job SET state = ?, lease_until = NULL, last_error = ?,
              run_after = UTC_TIMESTAMP(3) + INTERVAL ? SECOND WHERE id = ? AND state = 'running'`,
      [retryAfterS === null ? 'failed' : 'waiting', error.slice(0, 1000), retryAfterS ?? 0, id],
    );
  }

  /** Newest first. */
  async list(
    context: Context,
    companyId: string,
    limit: number,
    before: { createdAt: Date; id: string } | null,
  ): Promise<JobEntity[]> {
    const query = managerOf(context)
      .createQueryBuilder(JobEntity, 'job')
      .where('job.companyId = :companyId', { companyId })
      .orderBy('job.createdAt', 'DESC')
      .addOrderBy('job.id', 'DESC')
      .take(limit);
    if (before) query.andWhere('(job.createdAt, job.id) < (:createdAt, :id)', before);
    return query.getMany();
  }

  /** Done jobs older than 14 days go: what they did is recorded elsewhere. */
  async sweep(context: Context): Promise<void> {
    await managerOf(context).query(
      `DELETE FROM job WHERE state = 'done' AND created_at < UTC_TIMESTAMP(3) - INTERVAL 14 DAY LIMIT 1000`,
    );
  }
}
