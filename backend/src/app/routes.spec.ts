import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type { SequenceId } from '#shared/plant/ids';
import type { AnyRoute } from '../http/define-route';
import { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';
import { PROJECT_FOLDER } from './project-folder';
import { listRoutes } from './routes';

type Caller = 'nobody' | 'installer' | 'lead' | 'admin' | 'contractor' | 'stranger';

/**
 * Whom each route lets in, and what it answers to the others: `ok` is anything that isn't a refusal of access.
 * `stranger` is a lead of another company. A route without a row here fails the first test below.
 */
const TABLE: Readonly<Record<string, Readonly<Record<Caller, 'ok' | 401 | 403 | 404>>>> = {
  'get /health': everybody(),
  'get /installation-key': everybody(),
  'post /session': everybody(),
  'get /session': everybody(),
  'delete /session': everybody(),
  'post /session/password': signedIn(),
  'put /session/language': signedIn(),
  'post /devices': signedIn(),
  'get /events': signedIn(),
  'get /openings': signedIn(),
  'get /my/circuits': signedIn(),
  'post /entries': signedIn(),
  'get /review-queue': signedIn(),
  'get /jobs': { nobody: 401, installer: 403, lead: 403, admin: 'ok', contractor: 403, stranger: 403 },
  'post /openings': { nobody: 401, installer: 403, lead: 'ok', admin: 'ok', contractor: 403, stranger: 'ok' },
  'get /refrigerant-tables': company('ok', 'ok', 'ok', 403),
  'post /refrigerant-tables': company(403, 'ok', 'ok', 403),
  'get /openings/:openingId': opening('ok', 'ok', 'ok', 'ok'),
  'get /openings/:openingId/people': opening(403, 'ok', 'ok', 403),
  'get /openings/:openingId/circuits': opening('ok', 'ok', 'ok', 403),
  'put /openings/:openingId/assignments': opening(403, 'ok', 'ok', 403),
  'post /openings/:openingId/schedule-imports': opening(403, 'ok', 'ok', 403),
  'get /sequences/:sequenceId': opening('ok', 'ok', 'ok', 403),
  'get /openings/:openingId/suction-groups/:suctionGroupId/coils': opening('ok', 'ok', 'ok', 403),
  // Its access is asked of the service, for people whose role has ended: others learn nothing.
  'put /sequences/:sequenceId/photos/:sha256': signedIn(),
  'get /sequences/:sequenceId/photos/:sha256': opening('ok', 'ok', 'ok', 403),
  'post /sequences/:sequenceId/reviews': opening(403, 'ok', 'ok', 403),
  'get /openings/:openingId/defrost-plan': opening('ok', 'ok', 'ok', 403),
  'post /openings/:openingId/defrost-plan': opening(403, 'ok', 'ok', 403),
  'get /openings/:openingId/packages': opening(403, 'ok', 'ok', 'ok'),
  'post /openings/:openingId/packages': opening(403, 'ok', 'ok', 403),
  'get /packages/:packageId': opening(403, 'ok', 'ok', 'ok'),
  'post /packages/:packageId/cancellation': opening(403, 'ok', 'ok', 403),
  'get /packages/:packageId/document': opening(403, 'ok', 'ok', 'ok'),
  'post /packages/:packageId/acceptances': opening(403, 403, 403, 'ok'),
};

function everybody() {
  return {
    nobody: 'ok',
    installer: 'ok',
    lead: 'ok',
    admin: 'ok',
    contractor: 'ok',
    stranger: 'ok',
  } as const;
}

function signedIn() {
  return { ...everybody(), nobody: 401 } as const;
}

type Answer = 'ok' | 403;

function opening(installer: Answer, lead: Answer, admin: Answer, contractor: Answer) {
  return { nobody: 401, installer, lead, admin, contractor, stranger: 404 } as const;
}

/** Of the caller's own company, whichever that is. */
function company(installer: Answer, lead: Answer, admin: Answer, contractor: Answer) {
  return { nobody: 401, installer, lead, admin, contractor, stranger: lead } as const;
}

let server: TestServer;
let store: TestStore;
let stranger: TestStore;
let sequenceId: SequenceId;
let suctionGroupId: string;
let packageId: string;
let routes: readonly AnyRoute[];

beforeAll(async () => {
  server = await startTestServer();
  store = await makeStore(server, 'alpha');
  stranger = await makeStore(server, 'beta');
  sequenceId = (await importSmallSchedule(server, store)).get('A1') as SequenceId;
  const groups: { id: string }[] = await server.sql('SELECT id FROM suction_group WHERE opening_id = ?', [
    store.openingId,
  ]);
  suctionGroupId = groups[0]?.id ?? '';
  packageId = await insertPackage();
  routes = listRoutes(server.services);
}, 60_000);

afterAll(() => server.close());

async function insertPackage(): Promise<string> {
  const id = '01930000-0000-7000-8000-000000000001';
  await server.sql(
    `INSERT INTO handover_package (id, company_id, opening_id, version, language, state, progress, heads,
       circuits_approved, circuits_total, created_by, created_at)
     VALUES (?, ?, ?, 1, 'en', 'failed', 0, '{"systems":[]}', 0, 2, ?, NOW(3))`,
    [id, store.companyId, store.openingId, store.people.lead.id],
  );
  return id;
}

function pathOf(route: AnyRoute): string {
  return `/api${route.path}`
    .replace(':openingId', store.openingId)
    .replace(':sequenceId', sequenceId)
    .replace(':suctionGroupId', suctionGroupId)
    .replace(':packageId', packageId)
    .replace(':sha256', 'a'.repeat(64));
}

async function clientOf(caller: Caller): Promise<TestClient> {
  if (caller === 'nobody') return new TestClient(server);
  return caller === 'stranger' ? stranger.client('lead') : store.client(caller);
}

async function statusOf(route: AnyRoute, client: TestClient): Promise<{ status: number; code: string }> {
  if (route.path === '/events') {
    // An open stream never ends by itself: look at its head, then leave.
    const cookies = (
      client.agent as unknown as { jar: { getCookies(access: object): { toValueString(): string }[] } }
    ).jar
      .getCookies({ domain: '127.0.0.1', path: '/', secure: false, script: false })
      .map((cookie) => cookie.toValueString())
      .join('; ');
    const leave = new AbortController();
    const response = await fetch(`${server.url}${pathOf(route)}`, {
      headers: { cookie: cookies },
      signal: leave.signal,
    });
    const code = response.status === 200 ? '' : ((await response.json()) as { code: string }).code;
    leave.abort();
    return { status: response.status, code };
  }
  const response =
    route.method === 'get'
      ? await client.get(pathOf(route))
      : await client.send(route.method, pathOf(route), {});
  return { status: response.status, code: (response.body as { code?: string }).code ?? '' };
}

describe('the list of routes', () => {
  it('has a row in the access table for every route, and no row for none', () => {
    expect(routes.map((route) => `${route.method} ${route.path}`).sort()).toEqual(Object.keys(TABLE).sort());
  });

  it('holds every route file', () => {
    const source = join(PROJECT_FOLDER, 'backend', 'src');
    const files = readdirSync(source, { recursive: true, encoding: 'utf8' }).filter((name) =>
      name.endsWith('.route.ts'),
    );
    const list = readFileSync(join(source, 'app', 'routes.ts'), 'utf8');
    const forgotten = files.filter(
      (file) => !list.includes(`/${file.split('/').at(-1)?.replace(/\.ts$/, '')}'`),
    );
    expect(files.length).toBe(routes.length);
    expect(forgotten).toEqual([]);
  });

  it('gives a reason wherever access is public or only for oneself', () => {
    const without = routes.filter(({ access }) => access.kind !== 'action' && access.reason.length < 10);
    expect(without.map((route) => route.path)).toEqual([]);
  });
});

describe('access', () => {
  it.each(['nobody', 'installer', 'lead', 'admin', 'contractor', 'stranger'] as const)(
    'answers %s as the table says',
    async (caller) => {
      const found: Record<string, unknown> = {};
      const expected: Record<string, unknown> = {};
      for (const route of routes) {
        // Each route gets a client of its own, so that signing out or a new device in one doesn't touch the next.
        const { status, code } = await statusOf(route, await clientOf(caller));
        const key = `${route.method} ${route.path}`;
        const refused =
          [401, 403, 404].includes(status) && ['notSignedIn', 'notAllowed', 'notFound'].includes(code);
        // A missing photo or document is no refusal of access: its own code says so after access was given.
        const own = status === 404 && TABLE[key]?.[caller] === 'ok';
        found[key] = refused && !own ? status : 'ok';
        expected[key] = TABLE[key]?.[caller];
      }
      expect(found).toEqual(expected);
    },
    120_000,
  );

  it('refuses every write without the forgery token', async () => {
    const client = await store.client('lead');
    for (const route of routes.filter(({ method }) => method !== 'get')) {
      const method = route.method as 'post' | 'put' | 'delete';
      const response = await client.agent[method](pathOf(route)).send({});
      expect([route.path, response.status, response.body.code]).toEqual([route.path, 403, 'requestForged']);
    }
  });

  it('refuses a write from a page of another origin, token or not', async () => {
    const client = await store.client('lead');
    const response = await client.agent
      .post('/api/openings')
      .set('X-XSRF-TOKEN', await client.token())
      .set('Origin', 'https://elsewhere.example')
      .send({});
    expect(response.status).toBe(403);
  });

  it('answers an unknown address, and an id that is none, as a problem document', async () => {
    const client = await store.client('lead');
    for (const path of ['/api/nothing', '/api/openings/not-an-id', '/api/sequences/%00']) {
      const response = await client.get(path);
      expect(response.status).toBe(404);
      expect(response.headers['content-type']).toMatch(/application\/problem\+json/);
      expect(response.body.requestId).toMatch(/^[0-9a-f-]{36}$/);
    }
  });
});

describe('GET /openapi.json', () => {
  it('documents every route with the schemas that check it', async () => {
    const document = (await new TestClient(server).get('/api/openapi.json')).body;
    const operations = Object.values(document.paths as Record<string, object>).flatMap((path) =>
      Object.keys(path),
    );
    expect(operations.length).toBe(routes.length);
    expect(
      document.paths['/api/openings'].post.requestBody.content['application/json'].schema.required,
    ).toContain('name');
  });
});
