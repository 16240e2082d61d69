import { describe, expect, it } from '@jest/globals';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import { orderForReview, reasonsBesideOutcome, reasonsOf, type Surroundings } from './attention-order';

interface Shape {
  key: string;
  kind?: string;
  outcome?: string;
  doubts?: string[];
  answeredTwice?: boolean;
  answers?: number;
  photos?: string[];
  answer?: unknown;
  position?: number;
}

function step({
  key,
  kind = 'reading',
  outcome = 'within',
  doubts = [],
  answeredTwice = false,
  answers = 1,
  photos,
  answer,
  position = 1,
}: Shape): StepView {
  const current = {
    body: {
      content: {
        kind: 'answer',
        answer: photos
          ? { kind: 'photo', photos: photos.map((sha256) => ({ sha256 })) }
          : (answer ?? { kind }),
      },
    },
    server: { position, judgement: { doubts: doubts.map((doubt) => ({ kind: doubt, severity: 'ask' })) } },
  };
  return {
    step: { key, kind },
    fold: { outcome, answeredTwice },
    current,
    history: Array.from({ length: answers }, () => current),
    remark: null,
  } as unknown as StepView;
}

const viewOf = (...steps: StepView[]): SequenceView => ({ steps, late: [] }) as unknown as SequenceView;
const around = (change: Partial<Surroundings> = {}): Surroundings => ({
  photos: [],
  sentBackAt: 0,
  usedTwice: new Set(),
  withLate: new Set(),
  ...change,
});
const keys = (steps: readonly { view: StepView }[]): string[] => steps.map(({ view }) => view.step.key);

describe('orderForReview', () => {
  it('puts the gravest first and leaves the rest in working order', () => {
    const view = viewOf(
      step({ key: 'plain1' }),
      step({ key: 'corrected', answers: 2 }),
      step({ key: 'na', outcome: 'notApplicable' }),
      step({ key: 'out2', outcome: 'outside' }),
      step({ key: 'plain2' }),
      step({ key: 'liquid', doubts: ['liquidRisk'] }),
      step({ key: 'twice', answeredTwice: true }),
      step({ key: 'doubt', doubts: ['swapped'] }),
      step({ key: 'out8', outcome: 'outside' }),
    );
    const { first, rest } = orderForReview(view, [], 0);
    expect(keys(first)).toEqual(['out2', 'out8', 'liquid', 'doubt', 'twice', 'na', 'corrected']);
    expect(keys(rest)).toEqual(['plain1', 'plain2']);
    expect(rest.map(({ number }) => number)).toEqual([1, 5]);
  });
});

describe('orderForReview, in a second round', () => {
  it('puts what was recorded again behind what is outside or in danger, before everything else', () => {
    const view = viewOf(
      step({ key: 'doubt', doubts: ['swapped'] }),
      step({ key: 'again', answers: 2, position: 9 }),
      step({ key: 'before', answers: 2, position: 3 }),
      step({ key: 'liquid', doubts: ['liquidRisk'] }),
    );
    const { first } = orderForReview(view, [], 6);
    expect(keys(first)).toEqual(['liquid', 'again', 'doubt', 'before']);
    expect(first[1]?.reasons).toEqual(['recordedAgain']);
  });

  it('shows one picture on two steps at both of them', () => {
    const view = viewOf(
      step({ key: 'a', kind: 'photo', photos: ['p1'] }),
      step({ key: 'b', kind: 'photo', photos: ['p1'] }),
    );
    const { first } = orderForReview(view, [{ sha256: 'p1', state: 'checked' }], 0);
    expect(first.map(({ reasons }) => reasons)).toEqual([['photoTwice'], ['photoTwice']]);
  });
});

describe('reasonsBesideOutcome', () => {
  it('leaves out what the outcome mark says', () => {
    expect(reasonsBesideOutcome(['outside', 'liquidRisk'])).toEqual(['liquidRisk']);
  });
});

describe('reasonsOf', () => {
  it('asks for eyes on a hunting valve, a missing as-found, a note and what came late', () => {
    const steady = { valve: 'steady' };
    const hunting = { kind: 'superheat', asFound: steady, asLeft: { valve: 'hunting' } };
    const blind = { kind: 'superheat', asFound: null, asLeft: steady };
    const reasons = (answer: unknown, change: Partial<Surroundings> = {}) =>
      reasonsOf(step({ key: 's', answer }), around(change));
    expect(reasons(hunting)).toEqual(['hunting']);
    expect(reasons(blind)).toEqual(['noAsFound']);
    expect(reasons({ kind: 'note', text: 'Trap dry' })).toEqual(['note']);
    expect(reasons({ kind: 'confirm' }, { withLate: new Set(['s']) })).toEqual(['late']);
  });

  it('names every reason, the gravest first', () => {
    expect(
      reasonsOf(step({ key: 'a', outcome: 'outside', doubts: ['liquidRisk'], answers: 3 }), around()),
    ).toEqual(['outside', 'liquidRisk', 'corrected']);
  });

  it('does not call putting an override back a correction', () => {
    expect(reasonsOf(step({ key: 'o', kind: 'override', answers: 2 }), around())).toEqual([]);
    expect(reasonsOf(step({ key: 'o', kind: 'override', answers: 3 }), around())).toEqual(['corrected']);
  });

  it('asks for eyes where a photo is missing or broken', () => {
    const photos = [
      { sha256: 'p1', state: 'checked' as const },
      { sha256: 'p2', state: 'broken' as const },
    ];
    expect(reasonsOf(step({ key: 'p', kind: 'photo', photos: ['p1'] }), around({ photos }))).toEqual([]);
    expect(reasonsOf(step({ key: 'p', kind: 'photo', photos: ['p2', 'p3'] }), around({ photos }))).toEqual([
      'photoBroken',
      'photoAwaited',
    ]);
  });
});
