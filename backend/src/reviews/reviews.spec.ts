import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { uuidv7 } from 'uuidv7';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { Step } from '#shared/checklist/step';
import type { DeviceId, EntryId, SequenceId } from '#shared/plant/ids';
import { findBrokenLink } from '#shared/sequences/chain';
import { foldEntries } from '#shared/sequences/fold';
import { viewSequence } from '#shared/sequences/sequence-view';
import { demoAnswer, demoSignature } from '../demo/demo-answer';
import { steadyNumbers } from '../demo/steady-numbers';
import type { TestClient } from '../testing/test-client';
import { finishSequence } from '../testing/finish-sequence';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, SMALL_SCHEDULE, type TestStore } from '../testing/test-store';
import { until } from '../testing/until';

let server: TestServer;
let store: TestStore;
let sequences: Map<string, SequenceId>;
let installer: TestClient;
let lead: TestClient;
const random = steadyNumbers(7);

beforeAll(async () => {
  server = await startTestServer({ jobs: true });
  store = await makeStore(server, 'reviews');
  sequences = await importSmallSchedule(server, store);
  installer = await store.client('installer');
  lead = await store.client('lead');
}, 60_000);

afterAll(() => server.close());

const approval = (detail: SequenceDetail) => ({
  verdict: 'approved',
  headHash: detail.fold.headHash,
  signature: demoSignature('ignored', random),
});

describe('a circuit’s way through review', () => {
  const id = (): SequenceId => sequences.get('A1') as SequenceId;

  it('is submitted only when nothing is missing', async () => {
    const [early] = await installer.post([installer.submission(id())]);
    expect(early).toMatchObject({ result: 'stored', state: 'open' });
    const results = await finishSequence(installer, id(), random, 4);
    expect(results.at(-1)).toMatchObject({ result: 'stored', state: 'submitted' });
  }, 30_000);

  it('stands in the lead’s queue with what is outside', async () => {
    const { body } = await lead.get('/api/review-queue');
    expect(body.items).toMatchObject([
      { sequenceId: id(), code: 'A1', round: 1, submittedBy: 'installer of reviews', fourEyesBlocked: false },
    ]);
    expect(body.items[0].outsideCount).toBeGreaterThan(0);
    expect(body.items[0].photoCount).toBeGreaterThan(0);
  });

  it('is sent back with remarks on steps, and the installer gets a mail', async () => {
    const detail = await lead.sequence(id());
    const [stepKey] = Object.entries(detail.fold.steps).find(([, step]) => step.outcome === 'outside') as [
      string,
      unknown,
    ];
    const response = await lead.send('post', `/api/sequences/${id()}/reviews`, {
      verdict: 'sentBack',
      headHash: detail.fold.headHash,
      remarks: [{ stepKey, text: 'Open the valve a little.' }],
    });
    expect([response.status, response.body.state]).toEqual([201, 'sentBack']);
    const mail = await until(async () => (await server.mails())[0]);
    expect(mail.to).toEqual([store.people.installer.email]);
    expect(mail.text).toContain('Open the valve a little.');
    expect(mail.text).toContain(`/work/${id()}`);
    const after = await installer.sequence(id());
    const reopened = Object.entries(after.fold.steps).filter(([, step]) => step.reopenedBy !== null);
    expect(reopened.map(([key]) => key)).toEqual([stepKey]);
  });

  it('comes back in a second round and is approved with a signature', async () => {
    await finishSequence(installer, id(), random);
    const detail = await lead.sequence(id());
    expect(detail.fold).toMatchObject({ state: 'submitted', round: 2 });
    const response = await lead.send('post', `/api/sequences/${id()}/reviews`, approval(detail));
    expect(response.body.state).toBe('approved');
    const after = await lead.sequence(id());
    expect(after.fold.approvedHead).toBe(detail.fold.headHash);
    const review = after.entries.at(-1)?.body.content;
    expect(review).toMatchObject({ kind: 'review', signature: { printedName: 'lead of reviews' } });
    expect(findBrokenLink(after.entries)).toBeNull();
  }, 30_000);

  it('has its approval signed with the installation’s key', async () => {
    const rows = await server.sql<{ statement: string; signature: string }>(
      `SELECT statement, installation_signature AS signature FROM review WHERE verdict = 'approved'`,
    );
    const { statement, signature } = rows[0] as { statement: string; signature: string };
    expect(JSON.parse(statement)).toMatchObject({ sequenceId: id(), verdict: 'approved' });
    expect(server.services.key.verify(statement, signature)).toBe(true);
    expect(server.services.key.verify(statement.replace('approved', 'sentBack'), signature)).toBe(false);
  });

  it('takes an entry after the approval as late, outside the fold, and flags it', async () => {
    const before = await installer.sequence(id());
    const step = before.stepList.steps.find((candidate) => candidate.kind === 'note');
    const [late] = await installer.post([
      installer.answer(before, step as never, { kind: 'note', text: 'Found later' }),
    ]);
    expect(late).toMatchObject({ result: 'stored', standing: 'late', state: 'approved' });
    const after = await installer.sequence(id());
    expect(after.fold).toMatchObject({
      state: 'approved',
      lateCount: 1,
      approvedHead: before.fold.approvedHead,
    });
    expect(after.fold.steps).toEqual(before.fold.steps);
    expect(findBrokenLink(after.entries)).toBeNull();
  });

  it('cannot be approved again', async () => {
    const response = await lead.send(
      'post',
      `/api/sequences/${id()}/reviews`,
      approval(await lead.sequence(id())),
    );
    expect([response.status, response.body.code]).toEqual([409, 'wrongState']);
  });
});

describe('POST /sequences/:sequenceId/reviews', () => {
  const id = (): SequenceId => sequences.get('A2') as SequenceId;

  async function signAgain(): Promise<void> {
    const detail = await installer.sequence(id());
    const step = detail.stepList.steps.find((candidate) => candidate.kind === 'signature') as Step;
    const signature = demoSignature('installer of reviews', random);
    const known = detail.fold.steps[step.key]?.entryId ?? null;
    await installer.post([installer.answer(detail, step, { kind: 'signature', signature }, known)]);
  }

  beforeAll(async () => {
    await finishSequence(installer, id(), random);
  }, 30_000);

  it('refuses a verdict on a head that has moved on', async () => {
    const seen = await lead.sequence(id());
    const step = seen.stepList.steps.find((candidate) => candidate.kind === 'note');
    await installer.post([installer.answer(seen, step as never, { kind: 'note', text: 'One more thing' })]);
    const response = await lead.send('post', `/api/sequences/${id()}/reviews`, approval(seen));
    expect([response.status, response.body.code]).toEqual([409, 'changedMeanwhile']);
  });

  it('refuses an approval by whoever recorded some of it, and lets a second person give it', async () => {
    await lead.registerDevice();
    const seen = await lead.sequence(id());
    const step = seen.stepList.steps.find((candidate) => candidate.kind === 'note');
    await lead.post([lead.answer(seen, step as never, { kind: 'note', text: 'I helped' })]);
    const own = await lead.send(
      'post',
      `/api/sequences/${id()}/reviews`,
      approval(await lead.sequence(id())),
    );
    expect([own.status, own.body.code]).toEqual([403, 'fourEyes']);
    const admin = await store.client('admin');
    const { body } = await lead.get('/api/review-queue');
    expect(body.items.find((item: { sequenceId: string }) => item.sequenceId === id()).fourEyesBlocked).toBe(
      true,
    );
    expect((await admin.get('/api/review-queue')).body.items[0].fourEyesBlocked).toBe(false);
  });

  it('refuses an approval while something stands by hand or no longer counts', async () => {
    const second = await store.client('lead2');
    const before = await second.sequence(id());
    const override = before.stepList.steps.find((step) => step.kind === 'override') as Step;
    // Whatever is recorded after it was signed takes the signature with it.
    const signatureKey = before.stepList.steps.find((step) => step.kind === 'signature')?.key;
    const known = before.fold.steps[override.key]?.entryId ?? null;
    const set = installer.answer(before, override, { kind: 'override', phase: 'set', remark: '' }, known);
    await installer.post([set]);
    const refused = await second.send(
      'post',
      `/api/sequences/${id()}/reviews`,
      approval(await second.sequence(id())),
    );
    expect([refused.status, refused.body.code, refused.body.facts.missing]).toEqual([
      409,
      'wrongState',
      [override.key, signatureKey],
    ]);
    const back = installer.answer(
      before,
      override,
      { kind: 'override', phase: 'putBack', remark: '' },
      set.id,
    );
    await installer.post([back]);
    await signAgain();
  });

  it('refuses an approval while a photo that counts has not arrived', async () => {
    const second = await store.client('lead2');
    const detail = await second.sequence(id());
    const step = detail.stepList.steps.find((candidate) => candidate.kind === 'photo') as Step;
    const entry = detail.fold.steps[step.key]?.entryId as EntryId;
    const row = detail.entries.find((candidate) => candidate.body.id === entry);
    const named = row?.body.content.kind === 'answer' && row.body.content.answer;
    const photos = named && named.kind === 'photo' ? named.photos : [];
    const away = photos.map((photo) => ({ ...photo, sha256: 'd'.repeat(64) }));
    const gone = installer.answer(detail, step, { kind: 'photo', photos: [...away, ...photos] }, entry);
    await installer.post([gone]);
    await signAgain();
    const refused = await second.send(
      'post',
      `/api/sequences/${id()}/reviews`,
      approval(await second.sequence(id())),
    );
    expect([refused.body.code, refused.body.facts.awaitedPhotos]).toEqual(['wrongState', 1]);
    await installer.post([installer.answer(detail, step, { kind: 'photo', photos: [...photos] }, gone.id)]);
    await signAgain();
  });

  it('takes a typed name only when it is the reviewer’s own', async () => {
    const second = await store.client('lead2');
    const detail = await second.sequence(id());
    const typed = { ...demoSignature('Somebody Else', random), strokes: [], typed: true };
    const refused = await second.send('post', `/api/sequences/${id()}/reviews`, {
      ...approval(detail),
      signature: typed,
    });
    expect(refused.body.code).toBe('invalidInput');
  });

  it('refuses an empty signature, and remarks on steps that are not there', async () => {
    const second = await store.client('lead2');
    const detail = await second.sequence(id());
    const empty = { ...approval(detail), signature: { ...demoSignature('x', random), strokes: [] } };
    expect((await second.send('post', `/api/sequences/${id()}/reviews`, empty)).body.code).toBe(
      'invalidInput',
    );
    const remark = {
      verdict: 'sentBack',
      headHash: detail.fold.headHash,
      remarks: [{ stepKey: 'nowhere', text: 'x' }],
    };
    const response = await second.send('post', `/api/sequences/${id()}/reviews`, remark);
    expect([response.status, response.body.places[0].path]).toEqual([400, 'body.remarks.0.stepKey']);
  });

  it('asks for the password again when it was last given over 15 minutes ago', async () => {
    const second = await store.client('lead2');
    await server.sql(
      `UPDATE session SET data = REGEXP_REPLACE(data, '"passwordGivenAt":[0-9]+', '"passwordGivenAt":1000')`,
    );
    const detail = await second.sequence(id());
    const refused = await second.send('post', `/api/sequences/${id()}/reviews`, approval(detail));
    expect([refused.status, refused.body.code]).toEqual([403, 'passwordNeeded']);
    expect((await second.send('post', '/api/session/password', { password: 'wrong one' })).status).toBe(401);
    const again = await second.send('post', '/api/session/password', {
      password: 'fifteen characters or more',
    });
    expect(again.status).toBe(204);
  });

  it('lets one of two verdicts in the same second win, and tells the other', async () => {
    const [one, two] = [await store.client('lead2'), await store.client('admin')];
    const detail = await one.sequence(id());
    const remark = {
      verdict: 'sentBack',
      headHash: detail.fold.headHash,
      remarks: [{ stepKey: detail.stepList.steps[0]?.key, text: 'Again please' }],
    };
    const answers = await Promise.all([
      one.send('post', `/api/sequences/${id()}/reviews`, approval(detail)),
      two.send('post', `/api/sequences/${id()}/reviews`, remark),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
    expect(findBrokenLink((await one.sequence(id())).entries)).toBeNull();
  });
});

describe('a schedule that changes while a circuit is with the installer again', () => {
  it('keeps the state, the remark and the rounds the same for whoever folds the history later', async () => {
    const other = await makeStore(server, 'reimport');
    const id = (await importSmallSchedule(server, other)).get('A2') as SequenceId;
    const [phone, chief] = [await other.client('installer'), await other.client('lead')];
    await finishSequence(phone, id, random);
    const seen = await chief.sequence(id);
    const stepKey = seen.stepList.steps[0]?.key as string;
    await chief.send('post', `/api/sequences/${id}/reviews`, {
      verdict: 'sentBack',
      headHash: seen.fold.headHash,
      remarks: [{ stepKey, text: 'Again' }],
    });
    const person = await server.services.register.find(other.people.lead.id);
    const revised = Buffer.from(
      SMALL_SCHEDULE.toString('utf8').replace('Deli,20,29,6,8,1', 'Deli,20,29,6,8,2'),
    );
    await server.services.schedules.import(person, other.openingId, revised, true);
    const after = await phone.sequence(id);
    expect(after.stepListHash).not.toBe(seen.stepListHash);
    expect(foldEntries(after.entries, after.stepList.steps)).toEqual(after.fold);
    const view = viewSequence(after.stepList, after.entries);
    expect([view.fold.state, view.fold.round]).toEqual(['sentBack', 2]);
    expect(view.steps.find((step) => step.step.key === stepKey)?.remark?.text).toBe('Again');
  });

  it('asks by the schedule that stands now what was submitted during an import and then sent back', async () => {
    const other = await makeStore(server, 'overtaken');
    const id = (await importSmallSchedule(server, other)).get('A2') as SequenceId;
    const [phone, chief] = [await other.client('installer'), await other.client('lead')];
    await finishSequence(phone, id, random);
    const person = await server.services.register.find(other.people.lead.id);
    const revised = Buffer.from(
      SMALL_SCHEDULE.toString('utf8').replace('Deli,20,29,6,8,1', 'Deli,20,29,6,8,2'),
    );
    await server.services.schedules.import(person, other.openingId, revised, true);
    const submitted = await chief.sequence(id);
    const superheats = (detail: SequenceDetail) =>
      detail.stepList.steps.filter((step) => step.kind === 'superheat').length;
    expect([submitted.fold.state, superheats(submitted)]).toEqual(['submitted', 1]);
    const response = await chief.send('post', `/api/sequences/${id}/reviews`, {
      verdict: 'sentBack',
      headHash: submitted.fold.headHash,
      remarks: [{ stepKey: submitted.stepList.steps[0]?.key, text: 'Again' }],
    });
    expect(response.status).toBe(201);
    const after = await phone.sequence(id);
    expect([after.fold.state, superheats(after)]).toEqual(['sentBack', 2]);
    expect(foldEntries(after.entries, after.stepList.steps)).toEqual(after.fold);
    expect(findBrokenLink(after.entries)).toBeNull();
  });

  it('shows an approved circuit with the specification that was approved, and a dropped one still', async () => {
    const other = await makeStore(server, 'redesign');
    const id = (await importSmallSchedule(server, other)).get('A2') as SequenceId;
    const [phone, chief] = [await other.client('installer'), await other.client('lead')];
    await finishSequence(phone, id, random);
    await chief.send('post', `/api/sequences/${id}/reviews`, approval(await chief.sequence(id)));
    const person = await server.services.register.find(other.people.lead.id);
    const lines = SMALL_SCHEDULE.toString('utf8');
    const redesigned = Buffer.from(lines.replaceAll('R-448A', 'R-744'));
    await server.services.schedules.import(person, other.openingId, redesigned, true);
    expect((await chief.sequence(id)).specification.system.refrigerant).toBe('R-448A');
    const dropped = Buffer.from(lines.split('\n').slice(0, 3).join('\n'));
    await server.services.schedules.import(person, other.openingId, dropped, true);
    expect((await chief.sequence(id)).fold.state).toBe('approved');
  });
});

describe('a submission', () => {
  it('waits for its own entries, whatever a colleague submits, and keeps its author’s name', async () => {
    const other = await makeStore(server, 'submission');
    const id = (await importSmallSchedule(server, other)).get('A2') as SequenceId;
    const phone = await other.client('installer');
    const colleague = await other.client('lead2');
    await colleague.registerDevice();
    const detail = await phone.sequence(id);
    const steps = detail.stepList.steps.filter((step) => step.required);
    const scene = {
      specification: detail.specification,
      facts: detail.stepList.facts,
      author: 'x',
      random,
      photo: async () => ({
        sha256: 'e'.repeat(64),
        originalSha256: null,
        bytes: 9,
        width: 9,
        height: 9,
        capturedAt: null,
      }),
    };
    const bodies = [];
    for (const step of steps) bodies.push(phone.answer(detail, step, await demoAnswer(step, scene)));
    const submission = phone.submission(id);
    const [late, ...early] = bodies;
    await phone.post([...early, submission]);
    const vain = colleague.body(id, {
      kind: 'submission',
      restsOn: [{ deviceId: uuidv7() as DeviceId, count: 9 }],
    });
    expect(await colleague.post([vain])).toMatchObject([{ result: 'stored', state: 'open' }]);
    expect(await phone.post([late as (typeof bodies)[number]])).toMatchObject([{ state: 'submitted' }]);
    const { body } = await colleague.get('/api/review-queue');
    expect(body.items.find((item: { sequenceId: string }) => item.sequenceId === id).submittedBy).toBe(
      'installer of submission',
    );
  });
});
