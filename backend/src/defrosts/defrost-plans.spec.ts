import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type {
  DefrostDetails,
  DefrostPlanPage,
  DefrostPlanRequest,
  SavedDefrostPlan,
} from '#shared/contracts/defrost-plans';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { makeStore, type TestStore } from '../testing/test-store';

// A1 and A2 feed one walk-in box; A3 says nothing of its fail-safe time.
const SCHEDULE = Buffer.from(
  [
    'System,Refrigerant,Suction group,Circuit,Fixture,Fixture type,Class,Description,Area,Evap temp (°F),Discharge air (°F),SH low (°F),SH high (°F),Coils,Defrost,Defrosts per day,Fail-safe (min),Drip (min),Load (BTU/h)',
    'Rack A,R-448A,AS-1,A1,WI-1A,Walk-in,medium,Dairy box,Dairy,22,30,6,8,1,Electric,2,30,5,6000',
    'Rack A,R-448A,AS-1,A2,WI-1B,Walk-in,medium,Dairy box,Dairy,22,30,6,8,1,Electric,2,30,5,6000',
    'Rack A,R-448A,AS-1,A3,DC-1,Case,medium,Deli case,Deli,20,29,6,8,1,off-time,2,,,6000',
  ].join('\n'),
);
const HOUR_S = 3600;

let server: TestServer;
let store: TestStore;
let lead: TestClient;
let page: DefrostPlanPage;

beforeAll(async () => {
  server = await startTestServer();
  store = await makeStore(server, 'defrosts');
  const person = await server.services.register.find(store.people.lead.id);
  await server.services.schedules.import(person, store.openingId, SCHEDULE, true);
  lead = await store.client('lead');
  page = (await read(lead)).body as DefrostPlanPage;
}, 60_000);

afterAll(() => server.close());

const url = (): string => `/api/openings/${store.openingId}/defrost-plan`;
const read = (client: TestClient) => client.get(url());
const save = (client: TestClient, body: object) => client.send('post', url(), body);
const idOf = (code: string) =>
  page.circuits.find((circuit) => circuit.code === code)
    ?.id as DefrostPlanRequest['plan'][number]['circuitId'];

const given = (code: string, change: Partial<DefrostDetails>): DefrostDetails => ({
  circuitId: idOf(code),
  durationS: null,
  dripS: null,
  loadW: null,
  heaterW: null,
  box: null,
  airCurtain: null,
  fixedStartsS: [],
  ...change,
});

function request(change: Partial<DefrostPlanRequest> = {}): DefrostPlanRequest {
  const starts = (code: string, ...hours: number[]) => ({
    circuitId: idOf(code),
    startsS: hours.map((hour) => hour * HOUR_S),
  });
  return {
    basedOn: 0,
    rules: { ...USUAL_DEFROST_RULES, largestShareOfLoad: 0.5, quietHours: [] },
    details: [
      given('A1', { box: 'Dairy box' }),
      given('A2', { box: 'Dairy box' }),
      given('A3', { durationS: 2400, fixedStartsS: [8 * HOUR_S] }),
    ],
    plan: [starts('A1', 0, 12), starts('A2', 4, 16), starts('A3', 8, 20)],
    ...change,
  };
}

describe('GET /openings/:openingId/defrost-plan', () => {
  it('gives the circuits as the schedule has them, without the work of a system or a suction group', () => {
    expect(page.newest).toBeNull();
    expect(page.circuits.map(({ code, failSafeS }) => [code, failSafeS])).toEqual([
      ['A1', 1800],
      ['A2', 1800],
      ['A3', null],
    ]);
    expect(page.circuits[0]).toMatchObject({
      groupName: 'AS-1',
      perDay: 2,
      dripS: 300,
      walkIns: ['Dairy box'],
    });
  });
});

describe('POST /openings/:openingId/defrost-plan', () => {
  it('refuses a plan while nobody has said how long a circuit defrosts', async () => {
    const response = await save(lead, request({ details: [] }));
    expect([response.status, response.body.code]).toEqual([400, 'invalidInput']);
    expect(response.body.places).toEqual([
      { path: `body.details.${idOf('A3')}.durationS`, message: 'Missing or impossible for A3.' },
    ]);
  });

  it('saves a plan as version 1, with what was given by hand, who and when', async () => {
    const response = await save(lead, request());
    expect(response.status).toBe(201);
    const { newest } = (await read(lead)).body as DefrostPlanPage;
    expect(newest).toMatchObject({
      version: 1,
      breaches: [],
      createdByName: 'lead of defrosts',
      details: request().details,
      plan: request().plan,
    });
    expect(newest?.circuits.map(({ code, durationS, box }) => [code, durationS, box])).toEqual([
      ['A1', 1800, 'Dairy box'],
      ['A2', 1800, 'Dairy box'],
      ['A3', 2400, null],
    ]);
  });

  it('refuses a save on a version that is no longer the newest, and keeps the newest', async () => {
    const second = await store.client('lead2');
    const response = await save(second, request({ plan: [] }));
    expect([response.status, response.body.code]).toEqual([409, 'changedMeanwhile']);
    expect(response.body.facts).toEqual({ version: 1 });
    expect(((await read(lead)).body as DefrostPlanPage).newest?.version).toBe(1);
  });

  it('lets one of two saves at once through', async () => {
    const second = await store.client('lead2');
    const [first, other] = await Promise.all([
      save(lead, request({ basedOn: 1 })),
      save(second, request({ basedOn: 1 })),
    ]);
    expect([first.status, other.status].sort()).toEqual([201, 409]);
  });

  it('works the breaches out by itself and stores them with the plan', async () => {
    const together = request().plan.map((entry) => ({ ...entry, startsS: [0, 12 * HOUR_S] }));
    const response = await save(lead, {
      ...request({ basedOn: 2, plan: together, details: request().details }),
    });
    expect(response.status).toBe(201);
    const { newest } = (await read(lead)).body as DefrostPlanPage;
    expect(new Set(newest?.breaches.map(({ rule }) => rule))).toEqual(
      new Set(['fixedStarts', 'gapBetweenStarts', 'shareOfLoad', 'sharedBox']),
    );
    const stored = await server.sql<{ findings: string }>(
      'SELECT findings FROM defrost_plan WHERE version = 3',
    );
    expect((JSON.parse(stored[0]?.findings ?? '{}') as SavedDefrostPlan).breaches).toEqual(newest?.breaches);
  });

  it('tells in the audit trail who saved', async () => {
    const rows = await server.sql<{ person: string }>(
      "SELECT person_id AS person FROM audit WHERE action = 'defrostPlan.saved' ORDER BY created_at",
    );
    expect(rows.length).toBe(3);
    expect(rows[0]?.person).toBe(store.people.lead.id);
  });

  it('lets an installer read and not save', async () => {
    const installer = await store.client('installer');
    expect((await read(installer)).status).toBe(200);
    expect((await save(installer, request({ basedOn: 3 }))).body.code).toBe('notAllowed');
  });

  it('does not exist for another company', async () => {
    const stranger = await (await makeStore(server, 'elsewhere')).client('lead');
    expect((await read(stranger)).status).toBe(404);
    expect((await save(stranger, request({ basedOn: 3 }))).status).toBe(404);
  });

  it.each([
    ['a share above the whole', { rules: { ...USUAL_DEFROST_RULES, largestShareOfLoad: 1.2 } }],
    ['a start outside the day', { plan: [{ circuitId: 'x', startsS: [86_400] }] }],
    ['a negative version', { basedOn: -1 }],
  ])('refuses %s', async (_what, change) => {
    const response = await save(lead, { ...request({ basedOn: 3 }), ...change });
    expect([response.status, response.body.code]).toEqual([400, 'invalidInput']);
  });
});
