import type { Logger } from 'pino';
import type { Transactions } from '../database/transactions';
import type { JobKind, JobPayloads } from './job-kinds';
import { JOB_RULES } from './job-kinds';
import type { ClaimedJob, JobsRepository } from './jobs.repository';

/** What a job gets while it runs. */
export interface JobRun {
  readonly id: string;
  readonly attempts: number;
  /** Whether this is the last try: the job then leaves things in a state that people can read. */
  readonly isLastTry: boolean;
  readonly signal: AbortSignal;
  /** 0 to 1; also tells other workers that this one is alive. */
  progress(fraction: number): void;
}

export type JobHandlers = {
  readonly [K in JobKind]: (payload: JobPayloads[K], run: JobRun) => Promise<void>;
};

/** What is left to do for a job that is given up without another try: to leave things in a state that people can read. */
export type AbandonedHandlers = {
  readonly [K in JobKind]?: (payload: JobPayloads[K]) => Promise<void>;
};

const IDLE_MS = 700;
const HEARTBEAT_MS = 5_000;

/** Takes jobs one by one and runs them. Any number of workers, in this process or others, share the table. */
export class JobWorker {
  private readonly abort = new AbortController();
  private readonly loops: Promise<void>[] = [];
  private wake: (() => void)[] = [];

  constructor(
    private readonly transactions: Transactions,
    private readonly jobs: JobsRepository,
    private readonly handlers: JobHandlers,
    private readonly logger: Logger,
    private readonly abandoned: AbandonedHandlers = {},
  ) {}

  /** One loop a kind: a mail never waits behind photos, nor a package behind either. */
  start(): void {
    for (const kind of Object.keys(this.handlers) as JobKind[]) this.loops.push(this.loop(kind));
  }

  /** Looks for work now rather than at the next tick. */
  nudge(): void {
    for (const wake of this.wake.splice(0)) wake();
  }

  /** Ends the loops; what is running is told to stop, and is taken up again later. */
  async stop(): Promise<void> {
    this.abort.abort();
    this.nudge();
    await Promise.all(this.loops);
  }

  private async loop(kind: JobKind): Promise<void> {
    while (!this.abort.signal.aborted) {
      const job = await this.claim(kind);
      if (job?.isAbandoned) await this.abandon(job);
      else if (job) await this.run(job);
      else await this.idle();
    }
  }

  private async claim(kind: JobKind): Promise<ClaimedJob | null> {
    try {
      return await this.transactions.run((context) => this.jobs.claim(context, kind), 'READ COMMITTED');
    } catch (error) {
      // The database is away or restarting: the worker must outlive that.
      if (!this.abort.signal.aborted) this.logger.warn({ err: error }, 'could not look for jobs');
      return null;
    }
  }

  private async run(job: ClaimedJob): Promise<void> {
    const { outside } = this.transactions;
    let fraction = 0;
    const heartbeat = setInterval(() => {
      this.jobs.renew(outside, job.id, job.kind, fraction).catch((error: unknown) => {
        this.logger.warn({ err: error, job: job.id }, 'could not renew the lease');
      });
    }, HEARTBEAT_MS);
    const { maxAttempts } = JOB_RULES[job.kind];
    try {
      const handler = this.handlers[job.kind] as (payload: unknown, run: JobRun) => Promise<void>;
      await handler(job.payload, {
        id: job.id,
        attempts: job.attempts,
        isLastTry: job.attempts >= maxAttempts,
        signal: this.abort.signal,
        progress: (value) => {
          fraction = value;
        },
      });
      await this.jobs.finish(outside, job.id);
    } catch (error) {
      await this.fail(job, error, maxAttempts);
    } finally {
      clearInterval(heartbeat);
    }
  }

  /** Puts a job in order whose workers died with it. Whoever dies at this too leaves it to the next claim. */
  private async abandon(job: ClaimedJob): Promise<void> {
    this.logger.error({ job: job.id, kind: job.kind }, 'job given up: its workers died with it');
    const put = this.abandoned[job.kind] as ((payload: unknown) => Promise<void>) | undefined;
    try {
      await put?.(job.payload);
      await this.jobs.fail(this.transactions.outside, job.id, 'Its workers died with it.', null);
    } catch (error) {
      this.logger.warn(
        { err: error, job: job.id },
        'could not give a job up; tried again when its lease ends',
      );
    }
  }

  private async fail(job: ClaimedJob, error: unknown, maxAttempts: number): Promise<void> {
    const stopping = this.abort.signal.aborted;
    const givenUp = !stopping && job.attempts >= maxAttempts;
    this.logger[givenUp ? 'error' : 'warn']({ err: error, job: job.id, kind: job.kind }, 'job failed');
    const retryAfterS = givenUp ? null : Math.min(3600, 2 ** job.attempts);
    const text = error instanceof Error ? error.message : String(error);
    try {
      if (stopping) await this.jobs.giveBack(this.transactions.outside, job.id);
      else await this.jobs.fail(this.transactions.outside, job.id, text, retryAfterS);
    } catch (failure) {
      // Its lease runs out by itself and another worker takes it.
      this.logger.warn({ err: failure, job: job.id }, 'could not put a job back');
    }
  }

  private idle(): Promise<void> {
    return new Promise((resolve) => {
      const wake = () => {
        clearTimeout(timer);
        this.wake = this.wake.filter((other) => other !== wake);
        resolve();
      };
      const timer = setTimeout(wake, IDLE_MS);
      this.wake.push(wake);
    });
  }
}
