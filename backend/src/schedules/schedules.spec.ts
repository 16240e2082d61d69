import { afterAll, beforeAll, beforeEach, describe, expect, it } from '@jest/globals';
import type { CircuitRow } from '#shared/contracts/openings';
import type { SequenceId } from '#shared/plant/ids';
import { findBrokenLink } from '#shared/sequences/chain';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { harborStreetSchedule, makeStore, SMALL_SCHEDULE, type TestStore } from '../testing/test-store';

let server: TestServer;
let store: TestStore;
let lead: TestClient;

beforeAll(async () => {
  server = await startTestServer();
}, 60_000);

afterAll(() => server.close());

let stores = 0;

beforeEach(async () => {
  stores += 1;
  store = await makeStore(server, `schedules${stores}`);
  lead = await store.client('lead');
});

const importFile = (bytes: Buffer, store_ = true) =>
  lead.upload(
    'post',
    `/api/openings/${store.openingId}/schedule-imports?store=${store_}`,
    'schedule',
    bytes,
    'schedule.csv',
  );

/** Everything that is worked on: what stands for a system or a suction group too. */
const listed = async (): Promise<CircuitRow[]> =>
  (await lead.get(`/api/openings/${store.openingId}/circuits?limit=200`)).body.items as CircuitRow[];

const circuits = async (): Promise<CircuitRow[]> =>
  (await listed()).filter(({ level }) => level === 'circuit');

const edited = (change: (text: string) => string): Buffer =>
  Buffer.from(change(SMALL_SCHEDULE.toString('utf8')));

describe('POST /openings/:openingId/schedule-imports', () => {
  it('stores the whole schedule of the demo store, with a sequence for each system, group and circuit', async () => {
    const { status, body } = await importFile(harborStreetSchedule());
    expect(status).toBe(200);
    expect(body).toMatchObject({
      stored: true,
      revision: 1,
      systems: 2,
      suctionGroups: 5,
      circuits: 82,
      fixtures: 150,
    });
    expect(body.sequences).toBe(2 + 5 + 82);
    const rows = await listed();
    expect(rows.map((row) => row.code).slice(0, 8)).toEqual([
      'Rack A',
      'Rack B',
      'Rack A AS-1',
      'Rack A AS-2',
      'Rack A AS-3',
      'Rack B BS-1',
      'Rack B BS-2',
      'A1',
    ]);
    expect(rows.every((row) => row.stepsTotal >= 8 && row.state === 'open')).toBe(true);
  });

  it('checks without storing when asked to', async () => {
    expect((await importFile(SMALL_SCHEDULE, false)).body).toMatchObject({ stored: false, circuits: 2 });
    expect(await circuits()).toEqual([]);
  });

  it.each([
    [
      'a missing column',
      () => edited((text) => text.replace('Discharge air (°F)', 'Something')),
      422,
      'scheduleRefused',
    ],
    [
      'a repeated circuit',
      () => edited((text) => `${text}\nRack B,R-448A,BS-1,A1,B9-9,medium,x,y,22,30,6,8,1,off-time`),
      422,
      'scheduleRefused',
    ],
    [
      'a unit nobody knows',
      () => edited((text) => text.replace('SH low (°F)', 'SH low (furlong)')),
      422,
      'scheduleRefused',
    ],
    ['an empty file', () => Buffer.alloc(0), 415, 'notATable'],
    ['a PNG named .csv', () => Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), 415, 'notATable'],
    ['a 50 MB file', () => Buffer.alloc(50_000_000, 0x61), 413, 'tooLarge'],
  ] as const)('refuses %s whole, and stores nothing', async (_what, make, status, code) => {
    const response = await importFile(make());
    expect([response.status, response.body.code]).toEqual([status, code]);
    expect(response.headers['content-type']).toMatch(/application\/problem\+json/);
    expect(await circuits()).toEqual([]);
  });

  it('names row, column and reason of each problem', async () => {
    const bytes = edited((text) => text.replace('Deli case,Deli,20,29', 'Deli case,Deli,twenty,29'));
    const { body } = await importFile(bytes);
    expect(body.detail).toBe('"twenty" is not a number; write digits only, such as 12.5.');
    expect(body.facts.rows).toEqual([
      {
        row: 4,
        column: 'Evap temp (°F)',
        reason: { code: 'notANumber', params: { text: 'twenty' } },
        message: '"twenty" is not a number; write digits only, such as 12.5.',
      },
    ]);
  });

  it('keeps ids and recordings when a revised schedule comes, and asks new coils anew', async () => {
    await importFile(SMALL_SCHEDULE);
    const installer = await store.client('installer');
    const before = await circuits();
    const a1 = before[0] as CircuitRow;
    const detail = await installer.sequence(a1.sequenceId as SequenceId);
    const step = detail.stepList.steps.find((candidate) => candidate.kind === 'confirm');
    await installer.post([installer.answer(detail, step as never, { kind: 'confirm', confirmed: true })]);

    const revised = edited((text) =>
      text.replace(
        'A1-2,medium,Dairy multideck,Dairy,22,30,6,8,1',
        'A1-2,medium,Dairy multideck,Dairy,22,30,6,8,2',
      ),
    );
    expect((await importFile(revised)).body).toMatchObject({ revision: 2, coils: 4 });
    const after = await installer.sequence(a1.sequenceId as SequenceId);
    const superheats = (list: typeof after): number =>
      list.stepList.steps.filter(({ kind }) => kind === 'superheat').length;
    expect(superheats(after)).toBe(superheats(detail) + 1);
    expect(after.entries.slice(0, detail.entries.length + 1).map((entry) => entry.hash)).toEqual([
      ...detail.entries.map((entry) => entry.hash),
      expect.any(String),
    ]);
    expect(after.fold.steps[(step as { key: string }).key]).toMatchObject({ counts: true });
    expect(after.entries.filter((entry) => entry.body.content.kind === 'expansion')).toHaveLength(2);
    expect(findBrokenLink(after.entries)).toBeNull();
    const untouched = (await circuits())[1] as CircuitRow;
    expect(untouched.sequenceId).toBe(before[1]?.sequenceId);
  });

  it('asks a reading again whose limits a revised schedule changed, and nothing else', async () => {
    await importFile(SMALL_SCHEDULE);
    const installer = await store.client('installer');
    const id = (await circuits())[1]?.sequenceId as SequenceId;
    const detail = await installer.sequence(id);
    const steps = detail.stepList.steps.filter(({ kind }) => kind === 'superheat' || kind === 'confirm');
    const pair = {
      pressure: { text: '45', unit: 'psig' },
      temperature: { text: '28', unit: 'degF' },
    } as const;
    await installer.post(
      steps.map((step) =>
        installer.answer(
          detail,
          step,
          step.kind === 'superheat'
            ? { kind: 'superheat', asFound: null, asLeft: { valve: 'steady', pair } }
            : { kind: 'confirm', confirmed: true },
        ),
      ),
    );
    await importFile(edited((text) => text.replace('Deli,20,29,6,8,1', 'Deli,20,29,9,12,1')));
    const { fold } = await installer.sequence(id);
    const asked = Object.entries(fold.steps).filter(([, step]) => step.reopenedBy !== null);
    expect(asked.map(([key]) => key)).toEqual([steps.find(({ kind }) => kind === 'superheat')?.key]);
  });

  it('takes a circuit that the schedule dropped out of the lists without losing what was recorded', async () => {
    await importFile(SMALL_SCHEDULE);
    const dropped = edited((text) => text.split('\n').slice(0, 3).join('\n'));
    await importFile(dropped);
    expect((await circuits()).map((row) => row.code)).toEqual(['A1']);
    const kept = await server.sql<{ n: number }>(
      `SELECT COUNT(*) AS n FROM entry e JOIN sequence s ON s.id = e.sequence_id JOIN circuit c ON c.id = s.circuit_id
        WHERE s.opening_id = ? AND c.code = 'A2'`,
      [store.openingId],
    );
    expect(Number(kept[0]?.n)).toBe(1);
    await importFile(SMALL_SCHEDULE);
    expect((await circuits()).map((row) => row.code)).toEqual(['A1', 'A2']);
  });

  it('puts two imports at the same time one after the other', async () => {
    const answers = await Promise.all([importFile(SMALL_SCHEDULE), importFile(SMALL_SCHEDULE)]);
    expect(answers.map((answer) => answer.body.revision).sort()).toEqual([1, 2]);
    expect((await circuits()).map((row) => row.code)).toEqual(['A1', 'A2']);
  });
});

describe('PUT /openings/:openingId/assignments', () => {
  it('puts circuits on the installer’s list, and takes them off again', async () => {
    await importFile(SMALL_SCHEDULE);
    const [first] = await circuits();
    const installer = await store.client('installer');
    const assign = (personId: string | null) =>
      lead.send('put', `/api/openings/${store.openingId}/assignments`, {
        circuitIds: [first?.circuitId],
        personId,
      });
    expect((await assign(store.people.installer.id)).status).toBe(204);
    expect((await installer.get('/api/my/circuits')).body.items).toMatchObject([
      { code: 'A1', state: 'open' },
    ]);
    expect((await assign(null)).status).toBe(204);
    expect((await installer.get('/api/my/circuits')).body.items).toEqual([]);
  });

  it('refuses a contractor as assignee, and circuits of another opening', async () => {
    await importFile(SMALL_SCHEDULE);
    const [first] = await circuits();
    const put = (body: object) => lead.send('put', `/api/openings/${store.openingId}/assignments`, body);
    const contractor = await put({ circuitIds: [first?.circuitId], personId: store.people.contractor.id });
    expect(contractor.body.places[0].path).toBe('body.personId');
    const foreign = await put({ circuitIds: ['01930000-0000-7000-8000-000000000009'], personId: null });
    expect(foreign.body.places[0].path).toBe('body.circuitIds');
  });
});
