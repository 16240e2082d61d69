import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import type { Answer, StepOf } from '#shared/checklist/step';
import { floodHuntSchema, type FloodHunt } from '#shared/contracts/flood-hunt';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';

let server: TestServer;
let store: TestStore;
let sequences: Map<string, SequenceId>;
let phone: TestClient;
let groupId: string;

beforeAll(async () => {
  server = await startTestServer();
  store = await makeStore(server, 'hunt');
  sequences = await importSmallSchedule(server, store);
  phone = await store.client('installer');
  const group = (await phone.sequence(sequences.get('Rack A AS-1') as SequenceId)).specification.suctionGroup;
  groupId = group?.id ?? '';
}, 60_000);

afterAll(() => server.close());

const pathOf = (id: string) => `/api/openings/${store.openingId}/suction-groups/${id}/coils`;

async function hunt(): Promise<FloodHunt> {
  const response = await phone.get(pathOf(groupId));
  expect(response.status).toBe(200);
  return floodHuntSchema.parse(response.body);
}

const pair = (pressure: string, temperature: string) => ({
  pressure: { text: pressure, unit: 'psig' as const },
  temperature: { text: temperature, unit: 'degF' as const },
});

async function record(
  id: SequenceId,
  find: (detail: SequenceDetail) => SequenceDetail['stepList']['steps'][number] | undefined,
  answer: Answer,
) {
  const detail = await phone.sequence(id);
  const step = find(detail);
  if (!step) throw new Error('No such step.');
  await phone.post([phone.answer(detail, step, answer, detail.fold.steps[step.key]?.entryId ?? null)]);
  return step;
}

const superheatAt = (index: number) => (detail: SequenceDetail) =>
  detail.stepList.steps.filter((step): step is StepOf<'superheat'> => step.kind === 'superheat')[index];

describe('GET /openings/:openingId/suction-groups/:suctionGroupId/coils', () => {
  it('has every coil of the group once, unset at first, and none of the group’s own work', async () => {
    const { suctionGroupName, coils } = await hunt();
    expect(suctionGroupName).toBe('AS-1');
    expect(coils.map(({ fixtureTag, circuitCode }) => [fixtureTag, circuitCode])).toEqual([
      ['A1-1', 'A1'],
      ['A1-2', 'A1'],
      ['A2-1', 'A2'],
    ]);
    expect(coils.map(({ sequenceId }) => sequenceId)).toEqual([
      sequences.get('A1'),
      sequences.get('A1'),
      sequences.get('A2'),
    ]);
    for (const coil of coils)
      expect(coil).toMatchObject({
        superheatK: null,
        minimumSuperheatK: null,
        asLeftStale: false,
        overrideStanding: false,
        sinceDefrostS: null,
      });
  });

  it('tells the superheat as left, and its lowest where the valve hunted', async () => {
    const a1 = sequences.get('A1') as SequenceId;
    // Practice value: R-448A, 45 psig at sea level, dew 20.9 °F: 28 °F of line is 7.1 °F of superheat, 22 °F is 1.1 °F.
    await record(a1, superheatAt(0), {
      kind: 'superheat',
      asFound: null,
      asLeft: { valve: 'steady', pair: pair('45', '28') },
    });
    const step = await record(a1, superheatAt(1), {
      kind: 'superheat',
      asFound: null,
      asLeft: { valve: 'hunting', low: pair('45', '22'), high: pair('45', '32') },
    });
    const [first, second] = (await hunt()).coils;
    expect((first?.superheatK ?? 0) * 1.8).toBeCloseTo(7.1, 0);
    expect(first?.minimumSuperheatK).toBeNull();
    expect(second?.stepKey).toBe(step.key);
    expect((second?.minimumSuperheatK ?? 0) * 1.8).toBeCloseTo(1.1, 0);
    expect((second?.superheatK ?? 0) * 1.8).toBeCloseTo(6.1, 0);
  });

  it('tells of an override that stands on the circuit, and of no other circuit’s', async () => {
    const set: Answer = { kind: 'override', phase: 'set', remark: '' };
    const a1 = sequences.get('A1') as SequenceId;
    const find = ({ stepList }: SequenceDetail) => stepList.steps.find((step) => step.kind === 'override');
    await record(a1, find, set);
    expect((await hunt()).coils.map((coil) => coil.overrideStanding)).toEqual([true, true, false]);
    await record(a1, find, { ...set, phase: 'putBack' });
    expect((await hunt()).coils.map((coil) => coil.overrideStanding)).toEqual([false, false, false]);
  });

  it('calls a superheat stale when the regulator was set after it', async () => {
    const a1 = sequences.get('A1') as SequenceId;
    await record(a1, ({ stepList }) => stepList.steps.find((step) => step.key === 'regulator-set'), {
      kind: 'measurement',
      method: 'regulatorPressure',
      quantities: { pressure: { text: '45', unit: 'psig' } },
      words: {},
      rows: [],
    });
    expect((await hunt()).coils.map((coil) => coil.asLeftStale)).toEqual([true, true, false]);
  });

  it('has nothing for a group of another opening or none at all', async () => {
    const other = await makeStore(server, 'hunt-other');
    await importSmallSchedule(server, other);
    const rows: { id: string }[] = await server.sql('SELECT id FROM suction_group WHERE opening_id = ?', [
      other.openingId,
    ]);
    for (const id of [rows[0]?.id ?? '', '01930000-0000-7000-8000-00000000dead'])
      expect((await phone.get(pathOf(id))).status).toBe(404);
  });
});
