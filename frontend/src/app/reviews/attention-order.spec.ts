import { describe, expect, it } from '@jest/globals';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import { orderForReview, reasonsOf } from './attention-order';

interface Shape {
  key: string;
  kind?: string;
  outcome?: string;
  doubts?: string[];
  answeredTwice?: boolean;
  answers?: number;
  photos?: string[];
}

function step({
  key,
  kind = 'reading',
  outcome = 'within',
  doubts = [],
  answeredTwice = false,
  answers = 1,
  photos,
}: Shape): StepView {
  const current = {
    body: {
      content: {
        kind: 'answer',
        answer: photos ? { kind: 'photo', photos: photos.map((sha256) => ({ sha256 })) } : { kind },
      },
    },
    server: { judgement: { doubts: doubts.map((doubt) => ({ kind: doubt, severity: 'ask' })) } },
  };
  return {
    step: { key, kind },
    fold: { outcome, answeredTwice },
    current,
    history: Array.from({ length: answers }, () => current),
    remark: null,
  } as unknown as StepView;
}

const viewOf = (...steps: StepView[]): SequenceView => ({ steps }) as unknown as SequenceView;
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
    const { first, rest } = orderForReview(view, []);
    expect(keys(first)).toEqual(['out2', 'out8', 'liquid', 'twice', 'na', 'doubt', 'corrected']);
    expect(keys(rest)).toEqual(['plain1', 'plain2']);
    expect(rest.map(({ number }) => number)).toEqual([1, 5]);
  });
});

describe('reasonsOf', () => {
  it('names every reason, the gravest first', () => {
    expect(reasonsOf(step({ key: 'a', outcome: 'outside', doubts: ['liquidRisk'], answers: 3 }), [])).toEqual(
      ['outside', 'liquidRisk', 'corrected'],
    );
  });

  it('does not call putting an override back a correction', () => {
    expect(reasonsOf(step({ key: 'o', kind: 'override', answers: 2 }), [])).toEqual([]);
    expect(reasonsOf(step({ key: 'o', kind: 'override', answers: 3 }), [])).toEqual(['corrected']);
  });

  it('asks for eyes where a photo is missing or broken', () => {
    const photos = [
      { sha256: 'p1', state: 'checked' as const },
      { sha256: 'p2', state: 'broken' as const },
    ];
    expect(reasonsOf(step({ key: 'p', kind: 'photo', photos: ['p1'] }), photos)).toEqual([]);
    expect(reasonsOf(step({ key: 'p', kind: 'photo', photos: ['p2', 'p3'] }), photos)).toEqual([
      'photoBroken',
      'photoAwaited',
    ]);
  });
});
