import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { judge } from '#shared/checklist/judge';
import { MOST_SAMPLES, type TrendAnswer } from '#shared/checklist/kinds/trend';
import type { StepOf } from '#shared/checklist/step';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { findBrokenLink } from '#shared/sequences/chain';
import { sha256OfText } from '#shared/sequences/sha256';
import { stepText, templateText } from '../templates/engine/written-template.fixture';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';

let server: TestServer;
let store: TestStore;
let sequences: Map<string, SequenceId>;
let installer: TestClient;

const STEP = stepText(
  'kind: trend',
  'key: pull-down',
  'band: { high: 41 degF }',
  'hold: 24 h',
  'longest_excursion: 30 min',
  'source: FDA Food Code 3-501.16',
);
const TEMPLATE = templateText({ head: 'applies: "true"', steps: STEP }).replace(
  'priority: 5',
  'priority: 900',
);

/** The company's own checklist with a log in it, which no shipped one outranks. */
async function publish(source: string): Promise<void> {
  await server.sql(
    'INSERT INTO template_version (id, company_id, `key`, version, source, source_hash, created_at) VALUES (?, ?, ?, ?, ?, ?, NOW())',
    [randomUUID(), store.companyId, 'trial', 3, source, sha256OfText(source)],
  );
}

beforeAll(async () => {
  server = await startTestServer();
  store = await makeStore(server, 'trend');
  await publish(TEMPLATE);
  sequences = await importSmallSchedule(server, store);
  installer = await store.client('installer');
}, 60_000);

afterAll(() => server.close());

const detailOf = (code: string): Promise<SequenceDetail> =>
  installer.sequence(sequences.get(code) as SequenceId);
const stepOf = (detail: SequenceDetail): StepOf<'trend'> =>
  detail.stepList.steps.find((step) => step.kind === 'trend') as StepOf<'trend'>;

/** A sample every 20 s, falling from 294.15 K to 275.15 K in five hours: as many as an entry holds, of 33 hours. */
function log(samples: number, endK = 275.15): TrendAnswer {
  const atS = Array.from({ length: samples }, (_, index) => index * 20);
  return {
    kind: 'trend',
    file: { name: 'box 7.csv', sha256: 'b'.repeat(64), rows: samples },
    startText: '11/30/2026 06:00:00 AM',
    column: 'Air (°F)',
    atS,
    temperatureK: atS.map((at) => Math.round(100 * (endK + 19 * Math.max(1 - at / 18_000, 0))) / 100),
  };
}

describe('POST /entries with a log', () => {
  it('gets its band and its hold from the template', async () => {
    expect(stepOf(await detailOf('A1'))).toMatchObject({
      bandLowK: null,
      // 41 °F is 5 °C (NIST SP 811).
      bandHighK: expect.closeTo(278.15, 9),
      holdS: 86_400,
      longestExcursionS: 1800,
    });
  });

  it('takes the largest log that an entry holds, and judges it as the phone does', async () => {
    const before = await detailOf('A1');
    const step = stepOf(before);
    const answer = log(MOST_SAMPLES);
    expect(JSON.stringify(answer).length).toBeGreaterThan(75_000);
    const [result] = await installer.post([installer.answer(before, step, answer)]);
    const judgement = judge(step, answer, before.stepList.facts);
    expect(result).toMatchObject({ result: 'stored', standing: 'inOrder', judgement });
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, verdicts: ['trend_held'] });
    const after = await detailOf('A1');
    expect(after.entries.at(-1)?.body.content).toMatchObject({ answer });
    expect(after.fold.steps[step.key]).toMatchObject({ outcome: 'within', counts: true });
    expect(findBrokenLink(after.entries)).toBeNull();
  });

  it('keeps a hold that is still too short without letting it count', async () => {
    const before = await detailOf('A2');
    const step = stepOf(before);
    const [result] = await installer.post([installer.answer(before, step, log(3000))]);
    expect(result).toMatchObject({
      result: 'stored',
      judgement: {
        outcome: 'recorded',
        counts: false,
        verdicts: ['trend_notLongEnough'],
        doubts: [{ kind: 'incomplete', severity: 'keep' }],
      },
    });
    expect((await detailOf('A2')).fold.steps[step.key]?.counts).toBe(false);
  });

  it('judges a box that never gets there as outside, whatever the phone says', async () => {
    const before = await detailOf('A2');
    const step = stepOf(before);
    const honest = installer.answer(before, step, log(3000, 280), before.fold.steps[step.key]?.entryId);
    const content = { ...honest.content, workedOut: { outcome: 'within', counts: true, figures: [] } };
    const [result] = await installer.post([{ ...honest, content } as typeof honest]);
    expect(result).toMatchObject({
      result: 'stored',
      judgement: { outcome: 'outside', side: 'high', verdicts: ['trend_neverReached'] },
    });
  });

  it('takes a batch of about 1 MB, as a phone sends it', async () => {
    const detail = await detailOf('A1');
    const step = stepOf(detail);
    const bodies = Array.from({ length: 11 }, () => installer.answer(detail, step, log(MOST_SAMPLES)));
    const results = await installer.post(bodies);
    expect(results.map(({ result }) => result)).toEqual(bodies.map(() => 'stored'));
  });

  it('refuses more samples than an entry holds', async () => {
    const detail = await detailOf('A1');
    const [result] = await installer.post([installer.answer(detail, stepOf(detail), log(MOST_SAMPLES + 1))]);
    expect(result).toMatchObject({ result: 'refused' });
  });
});
