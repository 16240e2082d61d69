import { afterAll, beforeAll, beforeEach, describe, expect, it } from '@jest/globals';
import type { Context } from '../database/transactions';
import { startTestServer, type TestServer } from '../testing/test-server';
import { JOB_RULES, type MailPayload } from './job-kinds';
import { JobsRepository } from './jobs.repository';

const MAIL: MailPayload = { to: 'a@b.example', subject: 's', text: 't', html: 'h' };

describe('JobsRepository', () => {
  let server: TestServer;
  let companyId: string;
  let outside: Context;
  const jobs = new JobsRepository();

  beforeAll(async () => {
    server = await startTestServer();
    companyId = await server.services.register.addCompany('cold');
    outside = server.services.transactions.outside;
  });
  afterAll(() => server.close());
  beforeEach(() => server.sql('DELETE FROM job'));

  const insert = (key: string, context = outside) => jobs.insert(context, companyId, 'mail', key, MAIL);
  const claim = () =>
    server.services.transactions.run((context) => jobs.claim(context, 'mail'), 'READ COMMITTED');
  const row = async (id: string) =>
    (
      await server.sql<{
        state: string;
        attempts: number;
        last_error: string | null;
        wait: number;
        lease: number | null;
      }>(
        `SELECT state, attempts, last_error, TIMESTAMPDIFF(SECOND, UTC_TIMESTAMP(3), run_after) AS wait,
                TIMESTAMPDIFF(SECOND, UTC_TIMESTAMP(3), lease_until) AS lease FROM job WHERE id = ?`,
        [id],
      )
    )[0];
  const expireLease = (id: string) =>
    server.sql('UPDATE job SET lease_until = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND WHERE id = ?', [id]);
  const makeDue = (id: string) =>
    server.sql('UPDATE job SET run_after = UTC_TIMESTAMP(3) WHERE id = ?', [id]);

  it('gives what was enqueued, whole, once', async () => {
    await insert('one');
    expect(await claim()).toMatchObject({ kind: 'mail', companyId, payload: MAIL, attempts: 1 });
    expect(await claim()).toBeNull();
  });

  it('gives a worker no job of another kind', async () => {
    await insert('one');
    expect(await server.services.transactions.run((context) => jobs.claim(context, 'package'))).toBeNull();
    expect(await claim()).not.toBeNull();
  });

  it('takes the same key twice for one job, even when the first is done', async () => {
    await insert('one');
    await insert('one');
    const job = await claim();
    await jobs.finish(outside, job?.id ?? '');
    await insert('one');
    expect(await claim()).toBeNull();
    expect(await server.sql('SELECT id FROM job')).toHaveLength(1);
  });

  it('enqueues nothing when the transaction of its cause fails', async () => {
    const failing = server.services.transactions.run(async (context) => {
      await insert('one', context);
      throw new Error('the cause did not happen');
    });
    await expect(failing).rejects.toThrow('the cause');
    expect(await claim()).toBeNull();
  });

  it('gives two workers that claim at once two jobs, and neither waits for the other', async () => {
    await insert('one');
    await insert('two');
    const { transactions } = server.services;
    const first = await transactions.run(async (one) => {
      const mine = await jobs.claim(one, 'mail');
      // The first claim is not committed yet: the second must step over its row.
      const started = Date.now();
      const theirs = await transactions.run((two) => jobs.claim(two, 'mail'), 'READ COMMITTED');
      expect(Date.now() - started).toBeLessThan(2000);
      expect(theirs).not.toBeNull();
      expect(theirs?.id).not.toBe(mine?.id);
      return mine;
    }, 'READ COMMITTED');
    expect(first).not.toBeNull();
  });

  it('gives each of many jobs to exactly one of many workers', async () => {
    for (let index = 0; index < 12; index += 1) await insert(`job ${index}`);
    const claimed: string[] = [];
    const worker = async () => {
      for (let job = await claim(); job; job = await claim()) claimed.push(job.id);
    };
    await Promise.all([worker(), worker(), worker(), worker()]);
    expect(claimed).toHaveLength(12);
    expect(new Set(claimed).size).toBe(12);
  });

  it('takes up again what a crashed worker left behind, once its lease has run out', async () => {
    await insert('one');
    const job = await claim();
    expect((await row(job?.id ?? ''))?.lease).toBeGreaterThan(JOB_RULES.mail.leaseS - 5);
    expect(await claim()).toBeNull();
    await expireLease(job?.id ?? '');
    expect(await claim()).toMatchObject({ id: job?.id, attempts: 2 });
    expect(await claim()).toBeNull();
  });

  it('leaves a job with the worker that says it is alive', async () => {
    await insert('one');
    const job = await claim();
    await expireLease(job?.id ?? '');
    await jobs.renew(outside, job?.id ?? '', 'mail', 0.5);
    expect(await claim()).toBeNull();
  });

  it('puts a failed job back for later, with its reason', async () => {
    await insert('one');
    const job = await claim();
    await jobs.fail(outside, job?.id ?? '', 'mail server away', 120);
    expect(await row(job?.id ?? '')).toMatchObject({
      state: 'waiting',
      last_error: 'mail server away',
      lease: null,
    });
    expect((await row(job?.id ?? ''))?.wait).toBeGreaterThan(110);
    expect(await claim()).toBeNull();
    await makeDue(job?.id ?? '');
    expect(await claim()).toMatchObject({ id: job?.id, attempts: 2 });
  });

  it('gives a job up for good, and keeps it with its reason', async () => {
    await insert('one');
    const job = await claim();
    await jobs.fail(outside, job?.id ?? '', 'é'.repeat(3000), null);
    const kept = await row(job?.id ?? '');
    expect(kept).toMatchObject({ state: 'failed' });
    expect(kept?.last_error).toHaveLength(1000);
    await makeDue(job?.id ?? '');
    expect(await claim()).toBeNull();
  });

  it('hands a job out once more to be put in order when its workers died with every try', async () => {
    await insert('one');
    for (let attempt = 1; attempt <= JOB_RULES.mail.maxAttempts; attempt += 1) {
      const job = await claim();
      expect(job).toMatchObject({ attempts: attempt, isAbandoned: false });
      await expireLease(job?.id ?? '');
    }
    const left = await claim();
    expect(left).toMatchObject({ attempts: JOB_RULES.mail.maxAttempts, isAbandoned: true });
    expect(await claim()).toBeNull();
    await jobs.fail(outside, left?.id ?? '', 'its workers died with it', null);
    await expireLease(left?.id ?? '');
    expect(await claim()).toBeNull();
  });

  it('takes the job that has been due longest', async () => {
    await insert('one');
    await insert('two');
    await server.sql("UPDATE job SET run_after = run_after - INTERVAL 1 HOUR WHERE unique_key = 'two'");
    const second = await server.sql<{ id: string }>("SELECT id FROM job WHERE unique_key = 'two'");
    expect((await claim())?.id).toBe(second[0]?.id);
  });

  it('does not let a worker that lost its lease reopen what another has finished', async () => {
    await insert('one');
    const slow = await claim();
    await expireLease(slow?.id ?? '');
    const other = await claim();
    await jobs.finish(outside, other?.id ?? '');
    await jobs.fail(outside, slow?.id ?? '', 'woke up late', 0);
    expect(await row(slow?.id ?? '')).toMatchObject({ state: 'done' });
    expect(await claim()).toBeNull();
  });

  it('lists every job once over its pages, though many were written in the same moment', async () => {
    for (const key of ['one', 'two', 'three']) await insert(key);
    await server.sql("UPDATE job SET created_at = '2027-01-15 12:00:00.000'");
    const seen: string[] = [];
    let after: string | undefined;
    do {
      const page = await server.services.jobs.list(companyId, 2, after);
      seen.push(...page.items.map((item) => item.id));
      after = page.next ?? undefined;
    } while (after !== undefined && seen.length < 10);
    expect(new Set(seen).size).toBe(3);
    expect(seen).toHaveLength(3);
  });

  it('shows a company no other’s jobs', async () => {
    await insert('one');
    const stranger = await server.services.register.addCompany('other');
    expect((await server.services.jobs.list(stranger, 10, undefined)).items).toEqual([]);
  });

  it('sweeps what has been done for long, and nothing else', async () => {
    for (const key of ['done', 'failed', 'waiting', 'fresh']) await insert(key);
    await server.sql("UPDATE job SET state = unique_key WHERE unique_key <> 'fresh'");
    await server.sql("UPDATE job SET state = 'done' WHERE unique_key = 'fresh'");
    await server.sql("UPDATE job SET created_at = created_at - INTERVAL 15 DAY WHERE unique_key <> 'fresh'");
    await jobs.sweep(outside);
    const left = await server.sql<{ unique_key: string }>('SELECT unique_key FROM job ORDER BY unique_key');
    expect(left.map((job) => job.unique_key)).toEqual(['failed', 'fresh', 'waiting']);
  });
});
