import { afterEach, beforeEach, describe, expect, it, jest } from '@jest/globals';
import { pino } from 'pino';
import type { Transactions } from '../database/transactions';
import { JOB_RULES, type JobKind, type MailPayload } from './job-kinds';
import { JobWorker, type JobHandlers, type JobRun } from './job-worker';
import type { ClaimedJob, JobsRepository } from './jobs.repository';

const MAIL: MailPayload = { to: 'a@b.example', subject: 's', text: 't', html: 'h' };

/** A table of jobs in memory that notes what the worker does to it. */
class FakeJobs {
  readonly waiting: ClaimedJob[] = [];
  readonly log: string[] = [];
  claims = 0;
  isAway = false;

  async claim(_context: unknown, kind: JobKind): Promise<ClaimedJob | null> {
    this.claims += 1;
    if (this.isAway) throw new Error('database away');
    const at = this.waiting.findIndex((job) => job.kind === kind);
    return at < 0 ? null : (this.waiting.splice(at, 1)[0] ?? null);
  }
  async renew(_context: unknown, id: string, _kind: string, progress: number): Promise<void> {
    this.log.push(`renew ${id} ${progress}`);
  }
  async finish(_context: unknown, id: string): Promise<void> {
    this.log.push(`finish ${id}`);
  }
  async giveBack(_context: unknown, id: string): Promise<void> {
    this.log.push(`giveBack ${id}`);
  }
  async fail(_context: unknown, id: string, error: string, retryAfterS: number | null): Promise<void> {
    this.log.push(`fail ${id} ${error} ${retryAfterS}`);
  }
}

describe('JobWorker', () => {
  let jobs: FakeJobs;
  let worker: JobWorker;
  let mail: jest.Mock<JobHandlers['mail']>;
  let slow: jest.Mock<JobHandlers['package']>;
  const other = async () => undefined;

  beforeEach(() => {
    jest.useFakeTimers();
    jobs = new FakeJobs();
    mail = jest.fn<JobHandlers['mail']>(other);
    slow = jest.fn<JobHandlers['package']>(other);
    const transactions = {
      outside: {},
      run: (work: (context: unknown) => Promise<unknown>) => work({}),
    } as unknown as Transactions;
    worker = new JobWorker(
      transactions,
      jobs as unknown as JobsRepository,
      {
        mail: (payload, run) => mail(payload, run),
        photoCheck: other,
        package: (payload, run) => slow(payload, run),
      },
      pino({ level: 'silent' }),
      { mail: async (payload) => void jobs.log.push(`abandon ${payload.to}`) },
    );
  });
  afterEach(async () => {
    const stopped = worker.stop();
    await jest.advanceTimersByTimeAsync(2000);
    await stopped;
    jest.useRealTimers();
  });

  const give = (id: string, attempts = 1) =>
    jobs.waiting.push({ id, companyId: 'c', kind: 'mail', payload: MAIL, attempts, isAbandoned: false });
  /** For a job that never ends: nothing to wait for. */
  const forgetWorker = () => {
    worker = new JobWorker(
      {} as Transactions,
      {} as JobsRepository,
      {} as JobHandlers,
      pino({ level: 'silent' }),
    );
  };
  const pass = (ms: number) => jest.advanceTimersByTimeAsync(ms);

  it('runs what is waiting, one after the other, and finishes it', async () => {
    give('a');
    give('b');
    worker.start();
    await pass(10);
    expect(mail.mock.calls.map(([payload, run]) => [payload.to, run.id])).toEqual([
      [MAIL.to, 'a'],
      [MAIL.to, 'b'],
    ]);
    expect(jobs.log).toEqual(['finish a', 'finish b']);
  });

  it('lets no mail wait behind a package', async () => {
    slow.mockReturnValue(new Promise(() => undefined));
    jobs.waiting.push({
      id: 'p',
      companyId: 'c',
      kind: 'package',
      payload: {},
      attempts: 1,
      isAbandoned: false,
    });
    give('a');
    worker.start();
    await pass(10);
    expect(slow).toHaveBeenCalledTimes(1);
    expect(jobs.log).toEqual(['finish a']);
    forgetWorker();
  });

  it('looks again by itself within a second', async () => {
    worker.start();
    await pass(10);
    give('a');
    await pass(1000);
    expect(jobs.log).toEqual(['finish a']);
  });

  it('looks at once when it is nudged', async () => {
    worker.start();
    await pass(10);
    give('a');
    worker.nudge();
    await pass(1);
    expect(jobs.log).toEqual(['finish a']);
  });

  it.each([
    [1, 2],
    [3, 8],
    [11, 2048],
  ])('tries again after attempt %i in %i s', async (attempts, waitS) => {
    mail.mockRejectedValue(new Error('away'));
    give('a', attempts);
    worker.start();
    await pass(10);
    expect(jobs.log).toEqual([`fail a away ${waitS}`]);
  });

  it('gives up at the last attempt, and told the job that it was the last', async () => {
    const lasts: boolean[] = [];
    mail.mockImplementation(async (_payload: MailPayload, run: JobRun) => {
      lasts.push(run.isLastTry);
      throw new Error('away');
    });
    give('a', JOB_RULES.mail.maxAttempts - 1);
    give('b', JOB_RULES.mail.maxAttempts);
    worker.start();
    await pass(10);
    expect(lasts).toEqual([false, true]);
    expect(jobs.log).toEqual(['fail a away 2048', 'fail b away null']);
  });

  it('puts a job in order whose workers died with it, and does not try it again', async () => {
    const attempts = JOB_RULES.mail.maxAttempts;
    jobs.waiting.push({ id: 'a', companyId: 'c', kind: 'mail', payload: MAIL, attempts, isAbandoned: true });
    worker.start();
    await pass(10);
    expect(mail).not.toHaveBeenCalled();
    expect(jobs.log).toEqual([`abandon ${MAIL.to}`, 'fail a Its workers died with it. null']);
  });

  it('goes on with other jobs after one that failed, whatever was thrown', async () => {
    mail.mockRejectedValueOnce('no error at all');
    give('a');
    give('b');
    worker.start();
    await pass(10);
    expect(jobs.log).toEqual(['fail a no error at all 2', 'finish b']);
  });

  it('outlives a database that is away', async () => {
    jobs.isAway = true;
    worker.start();
    await pass(5000);
    jobs.isAway = false;
    give('a');
    await pass(1000);
    expect(jobs.log).toEqual(['finish a']);
  });

  it('says that it is alive, and how far it is, while a job runs long', async () => {
    let done: () => void = () => undefined;
    mail.mockImplementation((_payload: MailPayload, run: JobRun) => {
      run.progress(0.25);
      return new Promise((resolve) => (done = resolve));
    });
    give('a');
    worker.start();
    await pass(11_000);
    expect(jobs.log).toEqual(['renew a 0.25', 'renew a 0.25']);
    done();
    await pass(60_000);
    expect(jobs.log.slice(2)).toEqual(['finish a']);
  });

  it('renews well within the shortest lease', async () => {
    mail.mockImplementation(() => new Promise(() => undefined));
    give('a');
    worker.start();
    const shortest = Math.min(...Object.values(JOB_RULES).map((rule) => rule.leaseS));
    await pass((shortest * 1000) / 3);
    expect(jobs.log.length).toBeGreaterThan(1);
    forgetWorker();
  });

  it('stops: tells what runs, puts it back without a wait, and takes nothing more', async () => {
    mail.mockImplementation(
      (_payload: MailPayload, run: JobRun) =>
        new Promise((_resolve, reject) =>
          run.signal.addEventListener('abort', () => reject(new Error('told to stop'))),
        ),
    );
    give('a', JOB_RULES.mail.maxAttempts);
    give('b');
    worker.start();
    await pass(10);
    const stopped = worker.stop();
    await pass(10);
    await stopped;
    expect(jobs.log).toEqual(['giveBack a']);
    expect(jobs.waiting.map((job) => job.id)).toEqual(['b']);
    const { claims } = jobs;
    await pass(10_000);
    expect(jobs.claims).toBe(claims);
  });

  it('stops at once when nothing runs', async () => {
    worker.start();
    await pass(10);
    const stopped = worker.stop();
    await pass(1);
    await stopped;
    expect(jobs.log).toEqual([]);
  });

  it('does not grow while nobody nudges it', async () => {
    worker.start();
    await pass(700 * 200);
    expect((Reflect.get(worker, 'wake') as unknown[]).length).toBeLessThanOrEqual(
      Object.keys(JOB_RULES).length,
    );
  });
});
