import { beforeEach, describe, expect, it } from '@jest/globals';
import { judge } from '#shared/checklist/judge';
import { SUPERHEAT_CONDITIONS, type SuperheatAnswer } from '#shared/checklist/kinds/superheat';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { localView } from '../sequence/local-view';
import {
  bodyOf,
  cachedOf,
  confirmStep,
  contentOf,
  SEQUENCE,
  stepListOf,
  storedOf,
} from '../sequence/sequence.fixture';
import { DraftKeeper } from '../steps/draft-keeper';
import { startSuperheat, type TypedSuperheat } from '../steps/superheat-typed';
import { coilLine } from './coil-rows';
import { turnedValve, waitingRows } from './waiting-rows';

const NOW = Date.parse('2026-03-02T09:30:00.000Z');
const coil = (number: number) => ({ id: `coil-${number}`, number });
const FIXTURES = [
  { id: 'case-1', tag: 'C1', description: 'Dairy', coils: [coil(1), coil(2)] },
  { id: 'case-2', tag: 'C2', description: 'Deli', coils: [coil(3)] },
];
const step = (key: string, fixtureId: string, coilId: string) =>
  confirmStep(key, { kind: 'superheat', band: { lowK: 3, highK: 6 }, fixtureId, coilId } as never);
const STEPS = [
  step('deli', 'case-2', 'coil-3'),
  step('dairy.1', 'case-1', 'coil-1'),
  step('dairy.2', 'case-1', 'coil-2'),
  confirmStep('lights'),
];
const DETAIL = {
  stepList: stepListOf(STEPS),
  specification: { circuit: { code: 'A12', fixtures: FIXTURES } },
} as unknown as SequenceDetail;

const pair = (temperature: string) => ({
  pressure: { text: '45', unit: 'psig' as const },
  temperature: { text: temperature, unit: 'degF' as const },
});
const answer = (more: Partial<SuperheatAnswer> = {}): SuperheatAnswer => ({
  kind: 'superheat',
  asFound: { valve: 'steady', pair: pair('34') },
  asLeft: { valve: 'steady', pair: pair('28') },
  conditions: [...SUPERHEAT_CONDITIONS],
  ...more,
});
function recorded(number: number, key: string, given: SuperheatAnswer, at = '2026-03-02T09:00:00.000Z') {
  const asked = STEPS.find((one) => one.key === key)!;
  const judgement = judge(asked, given, DETAIL.stepList.facts);
  return storedOf(number, bodyOf(number, contentOf(key, given, judgement), { deviceTime: at }), judgement);
}

const FORM = startSuperheat(null);
const typed = { ...FORM.asLeft, pair: { pressure: '45', temperature: '28' } };
const turnedAt = (minutesAgo: number): TypedSuperheat['turns'] => [
  {
    turns: 0.25,
    direction: 'clockwise',
    at: new Date(NOW - minutesAgo * 60_000).toISOString(),
    beforeK: null,
    readBefore: null,
  },
];

const rowsOf = (entries: ReturnType<typeof recorded>[], drafts: Record<string, TypedSuperheat> = {}) =>
  coilLine(localView(cachedOf(STEPS, entries), []), DETAIL, (key) => drafts[key] ?? null, NOW).flatMap(
    ({ rows }) => rows,
  );
const states = (...given: Parameters<typeof rowsOf>) =>
  Object.fromEntries(rowsOf(...given).map(({ stepKey, state }) => [stepKey, state]));

describe('coilLine', () => {
  it('stands in the order of the line-up, whatever the order of the steps', () => {
    const line = coilLine(localView(cachedOf(STEPS, []), []), DETAIL, () => null, NOW);
    expect(line.map(({ tag, rows }) => [tag, rows.map(({ number }) => number)])).toEqual([
      ['C1', [1, 2]],
      ['C2', [3]],
    ]);
  });

  it('keeps the coil of a fixture that the schedule no longer has', () => {
    const detail = {
      ...DETAIL,
      specification: { circuit: { code: 'A12', fixtures: FIXTURES.slice(0, 1) } },
    } as unknown as SequenceDetail;
    const line = coilLine(localView(cachedOf(STEPS, []), []), detail, () => null, NOW);
    expect(line.map(({ tag, rows }) => [tag, rows.length])).toEqual([
      ['C1', 2],
      ['', 1],
    ]);
  });

  it('shows what was found, turned and left of a recorded coil', () => {
    const turns = [{ turns: 0.5, direction: 'clockwise' as const, at: '2026-03-02T08:40:00.000Z' }];
    const [row] = rowsOf([recorded(1, 'dairy.1', answer({ turns }))]);
    expect(row).toMatchObject({ state: 'done', isStale: false, turns, wait: null });
    // R-448A at 45 psig has its dew at 20.9 °F (program's own table).
    expect(row!.asFoundK! * 1.8).toBeCloseTo(13.1, 0);
    expect(row!.asLeftK! * 1.8).toBeCloseTo(7.1, 0);
  });

  it('tells the states of coils that are worked on at once', () => {
    const drafts = {
      'dairy.1': { ...FORM, asFound: typed, turns: turnedAt(5) },
      'dairy.2': { ...FORM, asFound: typed, turns: turnedAt(20) },
      deli: { ...FORM, asFound: typed },
    };
    expect(states([], drafts)).toEqual({ 'dairy.1': 'waiting', 'dairy.2': 'settled', deli: 'underWay' });
    expect(rowsOf([], drafts)[0]?.wait?.remainingS).toBe(600);
  });

  it('shows a draft before what was recorded, and leaves an empty one alone', () => {
    const entries = [recorded(1, 'deli', answer()), recorded(2, 'dairy.1', answer())];
    const drafts = { deli: { ...FORM, asLeft: typed }, 'dairy.1': FORM };
    expect(states(entries, drafts)).toEqual({ deli: 'typed', 'dairy.1': 'done', 'dairy.2': 'missing' });
  });

  it('marks coils stale whose neighbour’s valve was turned after they were read', () => {
    const turns = [{ turns: 0.25, direction: 'clockwise' as const, at: '2026-03-02T09:10:00.000Z' }];
    const entries = [
      recorded(1, 'dairy.1', answer()),
      recorded(2, 'dairy.2', answer({ turns }), '2026-03-02T09:25:00.000Z'),
    ];
    expect(states(entries)).toEqual({ 'dairy.1': 'stale', 'dairy.2': 'done', deli: 'missing' });
  });

  it('says of a preliminary reading that it does not count', () => {
    expect(states([recorded(1, 'deli', answer({ conditions: [] }))])['deli']).toBe('notCounting');
  });
});

describe('the waiting valves', () => {
  const keeper = new DraftKeeper();
  beforeEach(() => localStorage.clear());
  const rows = () =>
    waitingRows(
      keeper.all().flatMap((draft) => turnedValve(draft, DETAIL) ?? []),
      NOW,
    );

  it('are those of all drafts on this phone that were turned, the soonest first', () => {
    keeper.keep(SEQUENCE, 'dairy.1', { ...FORM, turns: turnedAt(5) });
    keeper.keep(SEQUENCE, 'dairy.2', { ...FORM, turns: turnedAt(12) });
    keeper.keep(SEQUENCE, 'deli', FORM);
    keeper.keep(SEQUENCE, 'lights', { isTicked: true });
    localStorage.setItem('something.else', '1');
    expect(rows().map(({ code, stepKey, wait }) => [code, stepKey, wait.remainingS])).toEqual([
      ['A12', 'dairy.2', 180],
      ['A12', 'dairy.1', 600],
    ]);
  });

  it('stay until the coil is read, and are gone then', () => {
    keeper.keep(SEQUENCE, 'dairy.1', { ...FORM, turns: turnedAt(40) });
    keeper.keep(SEQUENCE, 'dairy.2', { ...FORM, turns: turnedAt(40), asLeft: typed });
    expect(rows().map(({ stepKey, wait }) => [stepKey, wait.isOver])).toEqual([['dairy.1', true]]);
  });

  it('leave out circuits that this phone has no copy of', () => {
    const draft = { sequenceId: SEQUENCE, stepKey: 'dairy.1', typed: { ...FORM, turns: turnedAt(5) } };
    expect(turnedValve(draft, null)).toBeNull();
  });
});
