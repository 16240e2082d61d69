import { afterAll, beforeAll, beforeEach, describe, expect, it } from '@jest/globals';
import type { Step } from '#shared/checklist/step';
import type { CircuitRow } from '#shared/contracts/openings';
import type { NewRefrigerantTable, RefrigerantTable } from '#shared/contracts/refrigerants';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { printedPoints, TENTH_PSI_PA } from '#shared/refrigeration/makers-table/makers-table.fixture';
import type { MakersTableProblem } from '#shared/refrigeration/makers-table/makers-table';
import { refrigerant } from '#shared/refrigeration/readings.fixture';
import { sha256OfText } from '#shared/sequences/sha256';
import { stepText, templateText } from '../templates/engine/written-template.fixture';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { makeStore, SMALL_SCHEDULE, type TestStore } from '../testing/test-store';

// R-9X1 doesn't exist: its figures are those of R-448A every 10 K, printed to a tenth of a psi.
const PRINTING = { stepK: 10, fromK: 233.15, toK: 323.15, lastDigitPa: TENTH_PSI_PA };

const sheet = (changes: Partial<NewRefrigerantTable> = {}, of = 'R-448A'): NewRefrigerantTable => ({
  designation: 'R-9X1',
  issuer: 'Example Gases',
  edition: '2026-01',
  printedStepPa: TENTH_PSI_PA,
  safetyClass: 'A1',
  points: printedPoints(refrigerant(of), PRINTING).map(({ temperature, bubble, dew }) => ({
    temperatureK: temperature,
    bubblePa: bubble,
    dewPa: dew,
  })),
  confirmed: false,
  ...changes,
});

let server: TestServer;
let store: TestStore;
let lead: TestClient;
let stores = 0;

beforeAll(async () => {
  server = await startTestServer();
}, 60_000);

afterAll(() => server.close());

beforeEach(async () => {
  stores += 1;
  store = await makeStore(server, `refrigerants${stores}`);
  lead = await store.client('lead');
});

const add = (table: NewRefrigerantTable, client = lead) =>
  client.send('post', '/api/refrigerant-tables', table);
const list = async (client = lead): Promise<RefrigerantTable[]> =>
  (await client.get('/api/refrigerant-tables')).body.items as RefrigerantTable[];
const problemsOf = (response: { body: { facts: { problems: MakersTableProblem[] } } }) =>
  response.body.facts.problems.map(({ code, severity, row }) => [code, severity, row]);

const importWith = (designation: string, client = lead, openingId = store.openingId) =>
  client.upload(
    'post',
    `/api/openings/${openingId}/schedule-imports?store=true`,
    'schedule',
    Buffer.from(SMALL_SCHEDULE.toString('utf8').replaceAll('R-448A', designation)),
    'schedule.csv',
  );

async function sequenceOf(code: string): Promise<SequenceDetail> {
  const { items } = (await lead.get(`/api/openings/${store.openingId}/circuits?limit=200`)).body;
  const row = (items as CircuitRow[]).find((circuit) => circuit.code === code);
  return (await store.client('installer')).sequence(row?.sequenceId as SequenceId);
}

const STEADY = {
  kind: 'superheat',
  asFound: null,
  asLeft: {
    valve: 'steady',
    pair: { pressure: { text: '45', unit: 'psig' }, temperature: { text: '28', unit: 'degF' } },
  },
} as const;

/** Records a superheat on the circuit's first coil, and how the server judged it. */
async function judgedSuperheat(code: string) {
  const installer = await store.client('installer');
  const detail = await installer.sequence((await sequenceOf(code)).id);
  const step = detail.stepList.steps.find(({ kind }) => kind === 'superheat') as Step;
  await installer.post([installer.answer(detail, step, STEADY)]);
  const after = await installer.sequence(detail.id);
  return { step, judgement: after.entries.at(-1)?.server.judgement };
}

describe('POST /refrigerant-tables', () => {
  it('keeps a sheet for the company, with who entered it and a line in the audit trail', async () => {
    const response = await add(sheet({ safetyClass: 'A2L' }));
    expect(response.status).toBe(201);
    const { confirmed: _confirmed, ...kept } = sheet({ safetyClass: 'A2L' });
    expect(response.body).toMatchObject({
      ...kept,
      createdByName: `lead of refrigerants${stores}`,
      isInUse: true,
    });
    expect(await list()).toEqual([response.body]);
    const trail = await server.sql<{ after: unknown; personId: string }>(
      `SELECT \`after\`, person_id AS personId FROM audit WHERE action = 'refrigerantTable.added' AND subject = ?`,
      [response.body.id],
    );
    expect(trail).toHaveLength(1);
    expect(trail[0]?.personId).toBe(store.people.lead.id);
    expect(JSON.stringify(trail[0]?.after)).toContain('Example Gases');
    expect(JSON.stringify(trail[0]?.after)).toMatch(/safetyClass[\\": ]+A2L/);
  });

  it('writes a designation as checklists do', async () => {
    expect((await add(sheet({ designation: ' r454c ' }))).body.designation).toBe('R-454C');
    expect((await add(sheet({ designation: 'CO2' }, 'R-744'))).body.designation).toBe('R-744');
  });

  it('refuses what doesn’t hold together, by row, and stores nothing, confirmed or not', async () => {
    const points = sheet().points.map((point, index) =>
      index === 3 ? { ...point, dewPa: point.dewPa * 1.4 } : point,
    );
    const response = await add(sheet({ points, confirmed: true }));
    expect([response.status, response.body.code]).toEqual([400, 'invalidInput']);
    expect(problemsOf(response)).toEqual([['outlyingPoint', 'refuse', 4]]);
    const few = await add(sheet({ points: sheet().points.filter((_, index) => index % 4 === 0) }));
    expect(problemsOf(few)).toEqual([
      ['tooFewPoints', 'refuse', null],
      ['gapTooWide', 'refuse', 2],
      ['gapTooWide', 'refuse', 3],
    ]);
    expect(problemsOf(await add(sheet({ issuer: ' ' })))).toEqual([['noIssuer', 'refuse', null]]);
    expect(await list()).toEqual([]);
  });

  it('asks about what is unusual, and takes it once somebody has looked', async () => {
    const asked = await add(sheet({ edition: '' }));
    expect([asked.status, problemsOf(asked)]).toEqual([400, [['noEdition', 'ask', null]]]);
    expect(await list()).toEqual([]);
    expect((await add(sheet({ edition: '', confirmed: true }))).status).toBe(201);
  });

  it('asks about absolute pressures that were given as gauge ones', async () => {
    const points = sheet().points.map(({ temperatureK, bubblePa, dewPa }) => ({
      temperatureK,
      bubblePa: bubblePa + 101_325,
      dewPa: dewPa + 101_325,
    }));
    expect(problemsOf(await add(sheet({ points })))).toEqual([['absoluteTakenForGauge', 'ask', null]]);
  });

  it.each([
    ['a designation without a letter or digit', { designation: '--' }],
    ['a designation that no schedule could carry', { designation: 'R-9X1 of the north wing, new' }],
    ['a designation in letters that a schedule’s column has not', { designation: 'R-9Ж1' }],
    ['an issuer with a line break', { issuer: 'Example\nGases' }],
    ['a safety class that the standard has not', { safetyClass: 'A4' }],
    ['a sheet without a safety class', { safetyClass: undefined }],
    ['more rows than a sheet has', { points: Array.from({ length: 401 }, () => sheet().points[0]) }],
  ])('refuses %s', async (_what, changes) => {
    const response = await add(sheet(changes as Partial<NewRefrigerantTable>));
    expect([response.status, response.body.code]).toEqual([400, 'invalidInput']);
    expect(await list()).toEqual([]);
  });

  it('keeps one table when it is sent twice', async () => {
    await add(sheet());
    const again = await add(sheet());
    expect([again.status, again.body.code]).toEqual([409, 'alreadyThere']);
    expect(await list()).toHaveLength(1);
  });
});

describe('GET /refrigerant-tables', () => {
  it('shows both when only the safety class was put right, and works with the newer one', async () => {
    await add(sheet());
    expect((await add(sheet({ safetyClass: 'A2L' }))).status).toBe(201);
    expect((await list()).map(({ safetyClass, isInUse }) => [safetyClass, isInUse])).toEqual([
      ['A2L', true],
      ['A1', false],
    ]);
  });

  it('lists older tables too, and says which one is in use', async () => {
    await add(sheet());
    await add(sheet({ designation: 'r9x1', edition: '2026-07' }));
    await add(sheet({ designation: 'R-9X2' }));
    const found = (await list()).map(({ designation, edition, isInUse }) => [designation, edition, isInUse]);
    expect(found).toEqual([
      ['R-9X2', '2026-01', true],
      // As the older one is spelt, so that systems keep their refrigerant's name.
      ['R-9X1', '2026-07', true],
      ['R-9X1', '2026-01', false],
    ]);
  });

  it('goes page by page without losing a row', async () => {
    for (const edition of ['1', '2', '3']) await add(sheet({ edition }));
    const first = (await lead.get('/api/refrigerant-tables?limit=2')).body;
    const second = (
      await lead.get(`/api/refrigerant-tables?limit=2&after=${encodeURIComponent(first.next as string)}`)
    ).body;
    const editions = [...first.items, ...second.items].map((table: RefrigerantTable) => table.edition);
    expect([editions, second.next]).toEqual([['3', '2', '1'], null]);
  });

  it('shows another company nothing', async () => {
    await add(sheet());
    const stranger = await makeStore(server, `strangers${stores}`);
    for (const role of ['admin', 'lead', 'installer'] as const)
      expect(await list(await stranger.client(role))).toEqual([]);
    expect(await list(await store.client('installer'))).toHaveLength(1);
  });
});

describe('a schedule with a refrigerant that the program has no figures of', () => {
  it('is refused until the company has its maker’s table, and names the sheet on every result then', async () => {
    const refused = await importWith('R-9X1');
    expect([refused.status, refused.body.code]).toEqual([422, 'scheduleRefused']);
    expect(refused.body.facts.rows[0]).toMatchObject({
      reason: { code: 'unknownRefrigerant', params: { text: 'R-9X1' } },
      message: expect.stringContaining("maker's table"),
    });

    await add(sheet());
    expect((await importWith('r 9x1')).status).toBe(200);
    const { facts } = (await sequenceOf('A1')).stepList;
    expect([facts.refrigerant, facts.makersTable?.issuer]).toEqual(['R-9X1', 'Example Gases']);

    const { judgement } = await judgedSuperheat('A1');
    // 45 psig and 28 °F at sea level: 7.1 °F by the full R-448A table, see build-makers-table.spec.ts.
    const figure = judgement?.figures.find(({ unit }) => unit === 'K_diff');
    expect((figure?.value ?? NaN) * 1.8).toBeCloseTo(7.1, 0);
    expect(judgement?.working.map(({ source }) => source)).toEqual([
      expect.stringMatching(/^R-9X1: pressure–temperature table of Example Gases, 2026-01; 10 printed rows/),
    ]);
  });

  it('is asked by the safety class of that table, from the choice of the template on', async () => {
    const source = templateText({
      head: `applies: 'system.safetyClass == "A2L"'`,
      steps: stepText('kind: confirm', 'key: flammable-ready', `when: 'system.safetyClass != "A1"'`),
    }).replace('priority: 5', 'priority: 900');
    await server.sql(
      `INSERT INTO template_version (id, company_id, \`key\`, version, source, source_hash, created_at)
        VALUES (UUID(), ?, 'trial', 3, ?, ?, NOW(3))`,
      [store.companyId, source, sha256OfText(source)],
    );
    await importWith('R-448A');
    expect((await sequenceOf('A1')).stepList.template.key).not.toBe('trial');
    await add(sheet({ safetyClass: 'A2L' }));
    await importWith('R-9X1');
    const { stepList } = await sequenceOf('A1');
    expect(stepList.template.key).toBe('trial');
    expect(stepList.steps.map(({ key }) => key)).toEqual(['flammable-ready']);
    expect(stepList.facts.makersTable?.safetyClass).toBe('A2L');
  });

  it('stays refused for another company', async () => {
    await add(sheet());
    const stranger = await makeStore(server, `elsewhere${stores}`);
    const response = await importWith('R-9X1', await stranger.client('lead'), stranger.openingId);
    expect([response.status, response.body.code]).toEqual([422, 'scheduleRefused']);
  });
});

describe('a maker’s table of a refrigerant that the program has figures of', () => {
  // The figures of another refrigerant under this name: only so can be seen by which of the two is judged.
  const ours = sheet({ designation: 'R-448A', issuer: 'Example Gases', confirmed: true }, 'R-407A');

  it('takes precedence over those, and leaves other companies theirs', async () => {
    expect((await add(ours)).status).toBe(201);
    await importWith('R-448A');
    const { judgement } = await judgedSuperheat('A1');
    expect(judgement?.working[0]?.source).toContain('table of Example Gases');

    const stranger = await makeStore(server, `beside${stores}`);
    const theirLead = await stranger.client('lead');
    await importWith('R-448A', theirLead, stranger.openingId);
    const { items } = (await theirLead.get(`/api/openings/${stranger.openingId}/circuits?limit=200`)).body;
    const circuit = (items as CircuitRow[]).find(({ code }) => code === 'A1');
    const theirs = await theirLead.sequence(circuit?.sequenceId as SequenceId);
    expect(theirs.stepList.facts.makersTable).toBeUndefined();
  });

  it('reaches open circuits with the next import: superheats are asked again, confirmations are not', async () => {
    await importWith('R-448A');
    const { step } = await judgedSuperheat('A1');
    const installer = await store.client('installer');
    const detail = await installer.sequence((await sequenceOf('A1')).id);
    const confirm = detail.stepList.steps.find(({ kind }) => kind === 'confirm') as Step;
    await installer.post([installer.answer(detail, confirm, { kind: 'confirm', confirmed: true })]);

    await add(ours);
    expect((await sequenceOf('A1')).stepList.facts.makersTable).toBeUndefined();
    await importWith('R-448A');
    const after = await sequenceOf('A1');
    expect(after.stepList.facts.makersTable?.issuer).toBe('Example Gases');
    expect(after.fold.steps[confirm.key]).toMatchObject({ counts: true });
    expect(after.fold.steps[step.key]?.reopenedBy).not.toBeNull();
    expect(after.fold.steps[confirm.key]?.reopenedBy).toBeNull();
  });

  it('is taken over by a newer one', async () => {
    await add(ours);
    await importWith('R-448A');
    await add({ ...ours, edition: '2026-09' });
    expect((await sequenceOf('A1')).stepList.facts.makersTable?.edition).toBe('2026-01');
    await importWith('R-448A');
    expect((await sequenceOf('A1')).stepList.facts.makersTable?.edition).toBe('2026-09');
  });
});
