import { describe, expect, it } from '@jest/globals';
import type { StoredEntry } from '#shared/sequences/entry';
import type { FoldEntry } from '#shared/sequences/fold';
import type { StepView } from '#shared/sequences/sequence-view';
import {
  hasNote,
  isCorrected,
  isHunting,
  isRecordedAgain,
  lacksAsFound,
  lastSentBack,
  photosUsedTwice,
  reviewedRound,
  stepsWithLate,
} from './attention-facts';

const answered = (answer: unknown, position = 1): FoldEntry =>
  ({
    body: { content: { kind: 'answer', stepKey: 'a', answer } },
    server: { position },
  }) as unknown as FoldEntry;
const entry = (content: unknown, position: number, standing = 'inOrder'): StoredEntry =>
  ({ body: { content }, server: { position, standing } }) as unknown as StoredEntry;
const review = (verdict: string, position: number): StoredEntry =>
  entry({ kind: 'review', verdict }, position);
const submission = (position: number, standing = 'inOrder'): StoredEntry =>
  entry({ kind: 'submission' }, position, standing);
const view = (kind: string, ...history: FoldEntry[]): StepView =>
  ({ step: { kind }, history, current: history.at(-1) ?? null }) as unknown as StepView;

const pair = {};
const steady = { valve: 'steady', pair };

describe('isRecordedAgain', () => {
  const [first, second] = [
    answered({ kind: 'note', text: 'x' }, 3),
    answered({ kind: 'note', text: 'y' }, 9),
  ];

  it('holds for what was answered anew after it was sent back', () => {
    expect(isRecordedAgain(view('note', first, second), 6)).toBe(true);
  });

  it('does not hold in a first round, for what stands as it was, or for a first answer', () => {
    expect(isRecordedAgain(view('note', first, second), 0)).toBe(false);
    expect(isRecordedAgain(view('note', first), 6)).toBe(false);
    expect(isRecordedAgain(view('note', second), 6)).toBe(false);
  });
});

describe('lastSentBack', () => {
  it('is the position of the last review that sent it back', () => {
    expect(lastSentBack([])).toBe(0);
    expect(lastSentBack([review('sentBack', 4), submission(6), review('approved', 7)])).toBe(4);
  });
});

describe('isCorrected', () => {
  it('takes the second entry of an override for the other half of the work', () => {
    const one = answered({ kind: 'override' });
    expect(isCorrected(view('override', one, one))).toBe(false);
    expect(isCorrected(view('override', one, one, one))).toBe(true);
    expect(isCorrected(view('reading', one, one))).toBe(true);
  });
});

describe('isHunting and lacksAsFound', () => {
  it('look at how the valve was left and whether it was looked at before', () => {
    const hunting = answered({
      kind: 'superheat',
      asFound: steady,
      asLeft: { valve: 'hunting', low: pair, high: pair },
    });
    const blind = answered({ kind: 'superheat', asFound: null, asLeft: steady });
    expect([isHunting(hunting), isHunting(blind), isHunting(null)]).toEqual([true, false, false]);
    expect([lacksAsFound(hunting), lacksAsFound(blind), lacksAsFound(null)]).toEqual([false, true, false]);
  });
});

describe('hasNote', () => {
  it('holds for words, not for blanks', () => {
    expect(hasNote(answered({ kind: 'note', text: 'Trap still dry' }))).toBe(true);
    expect(hasNote(answered({ kind: 'note', text: '  ' }))).toBe(false);
    expect(hasNote(answered({ kind: 'confirm' }))).toBe(false);
  });
});

describe('photosUsedTwice', () => {
  const photos = (...hashes: string[]): FoldEntry =>
    answered({ kind: 'photo', photos: hashes.map((sha256) => ({ sha256 })) });

  it('names a picture that stands on two steps, not one that was superseded', () => {
    const steps = [
      view('photo', photos('a', 'b')),
      view('photo', photos('a'), photos('c')),
      view('photo', photos('b')),
    ];
    expect([...photosUsedTwice(steps)]).toEqual(['b']);
  });
});

describe('stepsWithLate', () => {
  it('names the steps of late answers', () => {
    expect([...stepsWithLate([answered({ kind: 'confirm' }), submission(9, 'late')])]).toEqual(['a']);
  });
});

describe('reviewedRound', () => {
  it.each([
    ['nothing yet', [], 1],
    ['a first submission', [submission(2)], 1],
    ['a second submission', [submission(2), review('sentBack', 3), submission(5)], 2],
    ['an approval after it', [submission(2), review('sentBack', 3), submission(5), review('approved', 6)], 2],
    ['a submission that came late', [submission(2), review('approved', 3), submission(5, 'late')], 1],
    [
      'a withdrawn approval',
      [submission(2), review('approved', 3), review('withdrawn', 4), submission(6)],
      2,
    ],
  ])('after %s', (_what, entries, round) => {
    expect(reviewedRound(entries)).toBe(round);
  });
});
