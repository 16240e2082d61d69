import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type { Step, StepOf } from '#shared/checklist/step';
import type { EntryResult, SequenceDetail } from '#shared/contracts/sequences';
import type { EntryId, SequenceId } from '#shared/plant/ids';
import { bodyHash, findBrokenLink } from '#shared/sequences/chain';
import { foldEntries } from '#shared/sequences/fold';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';

let server: TestServer;
let store: TestStore;
let sequences: Map<string, SequenceId>;
let installer: TestClient;

beforeAll(async () => {
  server = await startTestServer();
  store = await makeStore(server, 'entries');
  sequences = await importSmallSchedule(server, store);
  installer = await store.client('installer');
}, 60_000);

afterAll(() => server.close());

const a1 = (): SequenceId => sequences.get('A1') as SequenceId;

function stepOf<K extends Step['kind']>(detail: SequenceDetail, kind: K): StepOf<K> {
  return detail.stepList.steps.find((step) => step.kind === kind) as StepOf<K>;
}

function superheatOf(pressure: string, temperature: string) {
  return {
    kind: 'superheat',
    asFound: null,
    asLeft: {
      valve: 'steady',
      pair: { pressure: { text: pressure, unit: 'psig' }, temperature: { text: temperature, unit: 'degF' } },
    },
  } as const;
}

describe('POST /entries', () => {
  it('appends an answer, judges it on the server and chains it', async () => {
    const before = await installer.sequence(a1());
    const step = stepOf(before, 'superheat');
    // Practice value: R-448A, 45 psig at sea level and a line at 28 °F is 7.1 °F of superheat (dew 20.9 °F, computed).
    const [result] = await installer.post([installer.answer(before, step, superheatOf('45', '28'))]);
    expect(result).toMatchObject({
      result: 'stored',
      position: before.entries.length + 1,
      standing: 'inOrder',
    });
    const after = await installer.sequence(a1());
    const figures = after.entries.at(-1)?.server.judgement?.figures ?? [];
    expect((figures.find((figure) => figure.label === 'superheat')?.value ?? 0) * 1.8).toBeCloseTo(7.1, 0);
    expect(after.fold.steps[step.key]).toMatchObject({ outcome: 'within', counts: true });
    expect(findBrokenLink(after.entries)).toBeNull();
  });

  it('keeps its own judgement where the device worked out something else', async () => {
    const before = await installer.sequence(a1());
    const step = stepOf(before, 'superheat');
    const honest = installer.answer(
      before,
      step,
      superheatOf('45', '60'),
      before.fold.steps[step.key]?.entryId ?? null,
    );
    const content = { ...honest.content, workedOut: { outcome: 'within', counts: true, figures: [] } };
    const [result] = await installer.post([{ ...honest, content } as typeof honest]);
    expect(result).toMatchObject({ result: 'stored', judgement: { outcome: 'outside', side: 'high' } });
  });

  it('does nothing twice when the same entries are sent again', async () => {
    const detail = await installer.sequence(a1());
    const steps = detail.stepList.steps.filter((step) => step.kind === 'confirm').slice(0, 3);
    const bodies = steps.map((step) => installer.answer(detail, step, { kind: 'confirm', confirmed: true }));
    const first = await installer.post(bodies.slice(0, 2));
    const again = await installer.post(bodies);
    expect(again.map((result) => result.result)).toEqual(['alreadyStored', 'alreadyStored', 'stored']);
    expect(positions(again).slice(0, 2)).toEqual(positions(first));
    const after = await installer.sequence(a1());
    expect(after.entries.length).toBe(detail.entries.length + 3);
    expect(foldEntries(after.entries, after.stepList.steps)).toEqual(after.fold);
  });

  it('gives entries that arrive at once one position each', async () => {
    const detail = await installer.sequence(a1());
    const step = stepOf(detail, 'note');
    const bodies = Array.from({ length: 12 }, (_, index) =>
      installer.answer(detail, step, { kind: 'note', text: `Note ${index}` }),
    );
    const results = (await Promise.all(bodies.map((body) => installer.post([body])))).flat();
    expect(new Set(positions(results)).size).toBe(12);
    expect(findBrokenLink((await installer.sequence(a1())).entries)).toBeNull();
  });

  it('keeps both answers of two devices to one step, and says so', async () => {
    const other = await store.client('lead');
    await other.registerDevice();
    const detail = await installer.sequence(sequences.get('A2') as SequenceId);
    const step = stepOf(detail, 'confirm');
    await installer.post([installer.answer(detail, step, { kind: 'confirm', confirmed: true })]);
    const [second] = await other.post([other.answer(detail, step, { kind: 'confirm', confirmed: true })]);
    expect(second).toMatchObject({ result: 'stored' });
    const after = await installer.sequence(detail.id);
    expect(after.fold.steps[step.key]).toMatchObject({ answeredTwice: true, counts: true });
    expect(after.entries.filter((entry) => entry.body.content.kind === 'answer')).toHaveLength(2);
  });

  it('keeps an answer to a step that is not asked, without letting it count', async () => {
    const detail = await installer.sequence(a1());
    const step = { ...stepOf(detail, 'confirm'), key: 'no-such-step' };
    const [result] = await installer.post([
      installer.answer(detail, step, { kind: 'confirm', confirmed: true }),
    ]);
    expect(result).toMatchObject({
      result: 'stored',
      judgement: { counts: false, doubts: [{ kind: 'unknownStep' }] },
    });
  });

  it.each([
    ['is not a number', '4O', 'degF', 'notANumber'],
    ['lies outside physics', '-500', 'degF', 'belowAbsoluteZero'],
    ['has a unit of another kind', '40', 'psig', 'wrongUnit'],
    ['is empty', '', 'degF', 'empty'],
  ] as const)(
    'keeps a reading that %s, leaves its step open and names the reason',
    async (_what, text, unit, doubt) => {
      const detail = await installer.sequence(sequences.get('A2') as SequenceId);
      const step = detail.stepList.steps.find(
        (item) => item.kind === 'reading' && item.dimension === 'temperature',
      ) as Step;
      const [result] = await installer.post([
        installer.answer(detail, step, { kind: 'reading', value: { text, unit } }),
      ]);
      expect(result).toMatchObject({
        result: 'stored',
        judgement: { counts: false, doubts: [{ kind: doubt }] },
      });
      expect((await installer.sequence(detail.id)).fold.steps[step.key]?.counts).toBe(false);
    },
  );

  it('refuses only the bad one of a batch, each with its reason', async () => {
    const detail = await installer.sequence(a1());
    const good = installer.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'Good' });
    const foreign = {
      ...installer.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'x' }),
      authorId: store.people.lead.id,
    };
    const response = await installer.send('post', '/api/entries', {
      entries: [
        { body: { format: 1 }, bodyHash: 'a'.repeat(64) },
        { body: foreign, bodyHash: bodyHash(foreign) },
        { body: { ...good, deviceTime: new Date(0).toISOString() }, bodyHash: bodyHash(good) },
        { body: good, bodyHash: bodyHash(good) },
      ],
    });
    const results = (response.body as { results: EntryResult[] }).results;
    expect(response.status).toBe(200);
    expect(results.map((result) => result.result)).toEqual(['refused', 'refused', 'refused', 'stored']);
    expect(results.map((result) => ('reason' in result ? result.reason : null))).toEqual([
      { code: 'notAnEntry', params: { path: 'id' } },
      { code: 'otherAuthor', params: {} },
      { code: 'changedOnTheWay', params: {} },
      null,
    ]);
    expect(results[0]).toMatchObject({ message: 'It is not an entry as documented. See id.' });
  });

  it('refuses an entry that only the server may make', async () => {
    const forged = installer.body(a1(), {
      kind: 'review',
      verdict: 'approved',
      headHash: 'a'.repeat(64),
      remarks: [],
      signature: null,
      meaning: null,
    });
    expect(await installer.post([forged])).toMatchObject([
      { result: 'refused', reason: { code: 'serverOnly', params: {} } },
    ]);
  });

  it('tells a stranger nothing, and stores nothing', async () => {
    const other = await makeStore(server, 'strangers');
    const stranger = await other.client('installer');
    const detail = await installer.sequence(a1());
    const body = stranger.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'Hello' });
    expect(await stranger.post([body])).toMatchObject([
      {
        result: 'refused',
        reason: { code: 'noSuchSequence', params: {} },
        message: 'There is no such sequence for you.',
      },
    ]);
    expect((await installer.sequence(a1())).entries.length).toBe(detail.entries.length);
  });

  it('takes nothing from a contractor', async () => {
    const contractor = await store.client('contractor');
    await contractor.registerDevice();
    const detail = await installer.sequence(a1());
    const body = contractor.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'Hello' });
    expect(await contractor.post([body])).toMatchObject([{ result: 'refused' }]);
  });

  it('refuses an id in upper case, and a count that no device reaches', async () => {
    const detail = await installer.sequence(a1());
    const good = installer.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'x' });
    const loud = { ...good, id: good.id.toUpperCase() as EntryId };
    const many = { ...good, deviceCount: 2_147_483_648 };
    expect((await installer.post([loud, many])).map((result) => result.result)).toEqual([
      'refused',
      'refused',
    ]);
  });

  it('answers the same entry twice in one batch by what became of the first', async () => {
    const detail = await installer.sequence(a1());
    const body = installer.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'Once' });
    const results = await installer.post([body, body]);
    expect(results.map((result) => result.result)).toEqual(['stored', 'alreadyStored']);
    expect(new Set(positions(results)).size).toBe(1);
  });

  it('answers a body that is no batch with the exact places', async () => {
    const response = await installer.send('post', '/api/entries', {
      entries: [{ bodyHash: 'short' }],
      more: 1,
    });
    expect(response.status).toBe(400);
    expect(response.headers['content-type']).toMatch(/application\/problem\+json/);
    const paths = response.body.places.map((place: { path: string }) => place.path);
    expect(paths).toEqual(expect.arrayContaining(['body.entries.0.bodyHash']));
  });
});

describe('the device credential', () => {
  it('drains the outbox after the session has ended, and does nothing else', async () => {
    const phone = await store.client('installer');
    const detail = await phone.sequence(a1());
    await server.sql('DELETE FROM session');
    const body = phone.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'From the evening' });
    expect(await phone.post([body])).toMatchObject([{ result: 'stored' }]);
    expect((await phone.get('/api/my/circuits')).status).toBe(200);
    expect((await phone.get('/api/openings')).status).toBe(401);
    // A1 has entries of this person; A2 of this opening has some too, the other opening's none.
    expect((await phone.get(`/api/sequences/${a1()}`)).status).toBe(200);
    expect((await phone.send('post', `/api/sequences/${a1()}/reviews`, {})).status).toBe(401);
  });

  it('reads no circuit that is not its person’s', async () => {
    const other = await makeStore(server, 'devices');
    const theirs = await importSmallSchedule(server, other);
    const phone = await other.client('installer');
    await server.sql('DELETE FROM session');
    const response = await phone.get(`/api/sequences/${theirs.get('A1')}`);
    expect([response.status, response.body.code]).toEqual([404, 'notFound']);
  });

  it('ends with signing out, also where the session has ended by itself', async () => {
    const phone = await store.client('installer');
    const cookie = (
      (await phone.send('post', '/api/devices', { deviceId: phone.deviceId, label: 'x' })).headers[
        'set-cookie'
      ] as unknown as string[]
    )[0]?.split(';')[0] as string;
    await server.sql('DELETE FROM session');
    expect((await phone.send('delete', '/api/session')).status).toBe(204);
    const copied = await fetch(`${server.url}/api/my/circuits`, { headers: { cookie } });
    expect(copied.status).toBe(401);
  });

  it('speaks no more once it is revoked', async () => {
    const phone = await store.client('installer');
    await server.sql('UPDATE device SET revoked_at = NOW(3) WHERE id = ?', [phone.deviceId]);
    await server.sql('DELETE FROM session');
    expect((await phone.get('/api/my/circuits')).status).toBe(401);
  });

  it('goes on counting above what the server has', async () => {
    const phone = await store.client('installer');
    const detail = await phone.sequence(a1());
    await phone.post([phone.answer(detail, stepOf(detail, 'note'), { kind: 'note', text: 'One' })]);
    const again = await phone.send('post', '/api/devices', { deviceId: phone.deviceId, label: 'same' });
    expect(again.body).toMatchObject({ deviceId: phone.deviceId, lastCount: 1 });
  });
});

describe('somebody who is no longer allowed', () => {
  it('has entries held for a lead, outside the fold, not dropped', async () => {
    const phone = await store.client('installer');
    const detail = await phone.sequence(sequences.get('A2') as SequenceId);
    const step = detail.stepList.steps.filter((candidate) => candidate.kind === 'confirm')[2] as Step;
    await server.services.register.endMember(store.openingId, store.people.installer.id);
    const [result] = await phone.post([phone.answer(detail, step, { kind: 'confirm', confirmed: true })]);
    expect(result).toMatchObject({ result: 'stored', standing: 'held' });
    const lead = await store.client('lead');
    const after = await lead.sequence(detail.id);
    expect(after.fold.heldCount).toBe(1);
    expect(after.fold.steps[step.key]).toBeUndefined();
    await server.sql('UPDATE membership SET ended_at = NULL');
  });
});

describe('the chain', () => {
  it('shows a change made by SQL, and names the first broken link', async () => {
    const detail = await installer.sequence(a1());
    const victim = detail.entries[2] as SequenceDetail['entries'][number];
    await server.sql(`UPDATE entry SET body = REPLACE(body, '"format":1', '"format":1 ') WHERE id = ?`, [
      victim.body.id,
    ]);
    expect(findBrokenLink((await installer.sequence(a1())).entries)).toBeNull();
    await server.sql(`UPDATE entry SET body = REPLACE(body, ?, ?) WHERE id = ?`, [
      victim.body.deviceTime,
      '2020-01-01T00:00:00.000Z',
      victim.body.id as EntryId,
    ]);
    expect(findBrokenLink((await installer.sequence(a1())).entries)).toEqual({
      position: 3,
      fault: 'bodyHash',
    });
  });
});

function positions(results: readonly EntryResult[]): number[] {
  return results.map((result) => ('position' in result ? result.position : 0));
}
