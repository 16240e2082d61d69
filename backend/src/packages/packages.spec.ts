import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type { Response } from 'supertest';
import type { DefrostPlanPage } from '#shared/contracts/defrost-plans';
import type { HandoverPackage } from '#shared/contracts/packages';
import type { PackageId, SequenceId } from '#shared/plant/ids';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { demoSignature } from '../demo/demo-answer';
import { steadyNumbers } from '../demo/steady-numbers';
import { readPages } from '../pdf/read-pdf.fixture';
import { finishSequence } from '../testing/finish-sequence';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';
import { until } from '../testing/until';

let server: TestServer;
let store: TestStore;
let lead: TestClient;
let contractor: TestClient;
let issued: HandoverPackage;
const random = steadyNumbers(11);

beforeAll(async () => {
  server = await startTestServer({ jobs: true });
  store = await makeStore(server, 'packages');
  lead = await store.client('lead');
  contractor = await store.client('contractor');
}, 60_000);

afterAll(() => server.close());

const request = (language = 'en') =>
  lead.send('post', `/api/openings/${store.openingId}/packages`, { language });
const show = async (id: string): Promise<HandoverPackage> =>
  (await contractor.get(`/api/packages/${id}`)).body;

describe('POST /openings/:openingId/packages', () => {
  it('refuses to hand over nothing', async () => {
    await importSmallSchedule(server, store);
    const response = await request();
    expect([response.status, response.body.code]).toEqual([422, 'nothingToHandOver']);
  });

  it('builds a document, stores it under its hash and mails the contractor a link', async () => {
    const { items } = await server.services.openings.listCircuits(store.openingId, 200, undefined);
    const id = items.find(({ level }) => level === 'circuit')?.sequenceId as SequenceId;
    const installer = await store.client('installer');
    await finishSequence(installer, id, random);
    const detail = await lead.sequence(id);
    await lead.send('post', `/api/sequences/${id}/reviews`, {
      verdict: 'approved',
      headHash: detail.fold.headHash,
      signature: demoSignature('x', random),
    });
    const response = await request();
    expect([response.status, response.body.state]).toEqual([202, 'building']);
    issued = await until(async () => {
      const seen = await show(response.body.id);
      return seen.state === 'issued' && seen;
    });
    expect(issued).toMatchObject({ version: 1, circuitsApproved: 1, circuitsTotal: 2, acceptance: null });
    const document = await contractor.get(`/api/packages/${issued.id}/document`).buffer(true).parse(asBuffer);
    expect(document.headers['content-type']).toBe('application/pdf');
    expect(
      createHash('sha256')
        .update(document.body as Buffer)
        .digest('hex'),
    ).toBe(issued.sha256);
    const mail = await until(async () =>
      (await server.mails()).find((item) => item.to.includes(store.people.contractor.email)),
    );
    expect(mail.text).toContain(`/packages/${issued.id}`);
    expect(mail.text).toContain(issued.sha256);
    expect(mail.text).toContain(server.services.key.fingerprint);
  }, 60_000);

  it('gives each version a number, and lets one be stopped', async () => {
    const response = await request('es');
    expect(response.body.version).toBe(2);
    const stopped = await lead.send('post', `/api/packages/${response.body.id}/cancellation`, {});
    expect([200, 409]).toContain(stopped.status);
    const last = await until(async () => {
      const seen = await show(response.body.id);
      return seen.state !== 'building' && seen;
    });
    expect(last.state).toBe(stopped.status === 200 ? 'cancelled' : 'issued');
  }, 60_000);

  it('shows the defrost plan that counted when it was asked for, whatever is saved afterwards', async () => {
    const url = `/api/openings/${store.openingId}/defrost-plan`;
    const { circuits } = (await lead.get(url)).body as DefrostPlanPage;
    const details = circuits.map(({ id }) => ({
      circuitId: id,
      durationS: 1800,
      dripS: null,
      loadW: null,
      heaterW: null,
      box: null,
      airCurtain: null,
      fixedStartsS: [],
    }));
    const savePlan = (basedOn: number, startS: number) =>
      lead.send('post', url, {
        basedOn,
        rules: USUAL_DEFROST_RULES,
        details,
        plan: circuits.map(({ id }) => ({ circuitId: id, startsS: [startS] })),
      });
    expect((await savePlan(0, 11 * 3600 + 300)).status).toBe(201);
    const asked = (await request()).body as HandoverPackage;
    expect((await savePlan(1, 21 * 3600 + 600)).status).toBe(201);
    await until(async () => (await show(asked.id)).state === 'issued');
    const document = await contractor.get(`/api/packages/${asked.id}/document`).buffer(true).parse(asBuffer);
    const text = readPages(document.body as Buffer).join('\n');
    expect(text).toContain('Saved as version 1 by lead of packages');
    expect(text).toContain('11:05');
    expect(text).not.toContain('21:10');
  }, 60_000);
});

describe('GET /packages/:packageId/document', () => {
  it('goes on where a broken download stopped', async () => {
    const part = await contractor
      .get(`/api/packages/${issued.id}/document`)
      .set('Range', 'bytes=100-199')
      .buffer(true)
      .parse(asBuffer);
    expect(part.status).toBe(206);
    expect(part.headers['content-range']).toBe(`bytes 100-199/${issued.bytes}`);
    expect((part.body as Buffer).length).toBe(100);
  });

  it('is not there while a package is not issued', async () => {
    const row = await server.services.packages.request(
      {
        person: await server.services.register.find(store.people.lead.id),
        personName: 'x',
        via: 'session',
        deviceId: null,
        passwordGivenAt: new Date(),
      },
      store.openingId,
      'en',
    );
    const response = await contractor.get(`/api/packages/${row.id}/document`);
    expect(['wrongState', undefined]).toContain(response.body.code);
    await until(async () => (await show(row.id)).state !== 'building');
  }, 60_000);
});

describe('POST /packages/:packageId/acceptances', () => {
  const accept = (id: PackageId, sha256: string | null) =>
    contractor.send('post', `/api/packages/${id}/acceptances`, {
      sha256,
      signature: demoSignature('ignored', random),
    });

  it('refuses a signature under another document', async () => {
    const response = await accept(issued.id, 'f'.repeat(64));
    expect([response.status, response.body.code]).toEqual([409, 'changedMeanwhile']);
  });

  it('takes the contractor’s signature once, signed with the installation’s key', async () => {
    const response = await accept(issued.id, issued.sha256);
    expect(response.status).toBe(201);
    expect(response.body.acceptance).toMatchObject({ personName: 'contractor of packages' });
    expect((await accept(issued.id, issued.sha256)).body.code).toBe('alreadyThere');
    const [row] = await server.sql<{ statement: string; signature: string }>(
      'SELECT statement, installation_signature AS signature FROM acceptance',
    );
    expect(server.services.key.verify(row?.statement ?? '', row?.signature ?? '')).toBe(true);
  });
});

describe('a package that can’t be built', () => {
  it('is not issued, and says why, after its tries', async () => {
    const { jobs, transactions } = server.services;
    const created = await request();
    const id = created.body.id as PackageId;
    // Its own job is through with it first, or it would issue what is broken next.
    await until(async () => (await show(id)).state === 'issued');
    await server.sql(
      `UPDATE handover_package SET state = 'building', heads = 'no json', issued_at = NULL WHERE id = ?`,
      [id],
    );
    await transactions.run((context) =>
      jobs.enqueue(context, store.companyId, 'package', `again ${id}`, {
        packageId: id,
        openingId: store.openingId,
      }),
    );
    await server.sql(`UPDATE job SET attempts = 2 WHERE unique_key = ?`, [`again ${id}`]);
    const failed = await until(async () => {
      const seen = await show(id);
      return seen.state === 'failed' && seen;
    });
    expect(failed.failure).toBe('bug');
  }, 60_000);
});

function asBuffer(response: Response, done: (error: Error | null, body: unknown) => void): void {
  const parts: Buffer[] = [];
  const stream = response as unknown as NodeJS.ReadableStream;
  stream.on('data', (part: Buffer) => parts.push(part));
  stream.on('end', () => done(null, Buffer.concat(parts)));
}
