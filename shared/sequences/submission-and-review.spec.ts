import { describe, expect, it } from '@jest/globals';
import { confirmStep, entryId, hashOf, noteStep, personId, standing, stored, Story } from './entries.fixture';
import { applyEntry, foldEntries, missingSteps, type FoldEntry } from './fold';

const STEPS = [confirmStep('a'), noteStep('b'), confirmStep('extra', { required: false })];
const WORDS = { kind: 'note', text: 'Words' } as const;

/** A story that was submitted whole. */
function submitted() {
  const story = new Story(STEPS);
  const entries = stored([story.answer(1, 'a'), story.answer(1, 'b', WORDS), story.submission(1)]);
  return { story, entries, state: foldEntries(entries, STEPS) };
}

const apply = (state: ReturnType<typeof foldEntries>, ...entries: FoldEntry[]) =>
  entries.reduce((now, entry) => applyEntry(now, entry, STEPS), state);

const missing = (state: ReturnType<typeof foldEntries>) => missingSteps(state, STEPS).map((step) => step.key);

describe('a submission', () => {
  it('takes effect when everything it rests on is there', () => {
    expect(submitted().state).toMatchObject({ state: 'submitted', pending: [], round: 1 });
  });

  it('waits for entries of another phone, and takes effect with the last of them', () => {
    const story = new Story(STEPS);
    const mine = story.answer(1, 'a');
    const [theirs, more] = [story.answer(2, 'b', WORDS), story.answer(2, 'extra')];
    const submission = story.submission(1, [
      [1, 1],
      [2, 2],
    ]);
    const waiting = foldEntries([mine, submission], STEPS);
    expect(waiting).toMatchObject({ state: 'open', pending: [{ entryId: submission.body.id }] });
    // Out of order: nothing is missing after this one, but the entry before it has not arrived.
    const stillWaiting = apply(waiting, more);
    expect(stillWaiting.state).toBe('open');
    expect(apply(stillWaiting, theirs)).toMatchObject({ state: 'submitted', pending: [] });
  });

  it('waits for entries it rests on even when no required step is missing', () => {
    const story = new Story(STEPS);
    const done = [story.answer(1, 'a'), story.answer(1, 'b', WORDS)];
    const waiting = foldEntries([...done, story.submission(1, [[2, 1]])], STEPS);
    expect(missing(waiting)).toEqual([]);
    expect(waiting.state).toBe('open');
    expect(apply(waiting, story.answer(2, 'extra')).state).toBe('submitted');
  });

  it('waits while a required step lacks an answer that counts', () => {
    const story = new Story(STEPS);
    const waiting = foldEntries(
      [story.answer(1, 'a'), story.answer(1, 'b', { kind: 'note', text: '' }), story.submission(1)],
      STEPS,
    );
    expect(waiting).toMatchObject({ state: 'open' });
    expect(waiting.pending).toHaveLength(1);
    expect(missing(waiting)).toEqual(['b']);
  });

  it('replaces an earlier one of the same author, and nobody else’s', () => {
    const story = new Story(STEPS);
    const first = story.submission(1, [[3, 5]]);
    const theirs = story.submission(2, [[3, 6]]);
    const second = story.submission(1, [[3, 7]]);
    const ids = foldEntries([first, theirs, second], STEPS).pending.map((pending) => pending.entryId);
    expect(ids.sort()).toEqual([theirs.body.id, second.body.id].sort());
  });

  it('is that of whoever’s submission has all that it rests on', () => {
    const story = new Story(STEPS);
    const entries = [
      story.submission(1, [[3, 9]]),
      story.submission(2, []),
      story.answer(3, 'a'),
      story.answer(3, 'b', WORDS),
    ];
    expect(foldEntries(entries.slice(0, 3), STEPS)).toMatchObject({ state: 'open', submittedBy: null });
    expect(foldEntries(entries, STEPS)).toMatchObject({
      state: 'submitted',
      submittedBy: personId(2),
      pending: [],
    });
  });

  it('makes a recorder of whoever submits: the same person can’t approve', () => {
    expect(foldEntries([new Story(STEPS).submission(4)], STEPS).recorders).toEqual([personId(4)]);
  });

  it('does nothing to the state when it comes twice', () => {
    const { story, state } = submitted();
    expect(apply(state, story.submission(1)).state).toBe('submitted');
  });
});

describe('a review', () => {
  it('approves a submitted sequence and keeps the head that was approved', () => {
    const { story, state } = submitted();
    const approved = apply(state, story.review('approved', state.headHash));
    expect(approved).toMatchObject({ state: 'approved', approvedHead: hashOf(3), round: 2 });
  });

  it.each(['approved', 'sentBack', 'withdrawn'] as const)(
    'does nothing (%s) on an open sequence',
    (verdict) => {
      const story = new Story(STEPS);
      const before = foldEntries([story.answer(1, 'a')], STEPS);
      expect(apply(before, story.review(verdict, hashOf(1), ['a']))).toEqual(before);
    },
  );

  it('asks again for the steps with a remark and for no others', () => {
    const { story, state } = submitted();
    const review = story.review('sentBack', state.headHash, ['b']);
    const back = apply(state, review);
    expect(back).toMatchObject({ state: 'sentBack', round: 2, approvedHead: null, pending: [] });
    expect(missing(back)).toEqual(['b']);
    expect(back.steps['a']?.reopenedBy).toBeNull();
    expect(back.steps['b']).toMatchObject({ reopenedBy: review.body.id, counts: true });
  });

  it('keeps a submission waiting for a step that it asks for again, even one that is not required', () => {
    const story = new Story(STEPS);
    const done = [story.answer(1, 'a'), story.answer(1, 'b', WORDS), story.answer(1, 'extra')];
    const state = foldEntries([...done, story.submission(1)], STEPS);
    const back = apply(state, story.review('sentBack', state.headHash, ['extra']));
    expect(missing(back)).toEqual(['extra']);
    const waiting = apply(back, story.submission(1));
    expect(waiting.state).toBe('sentBack');
    expect(apply(waiting, story.answer(1, 'extra')).state).toBe('submitted');
  });

  it('is answered by a new answer that counts, and then submitted again', () => {
    const { story, entries, state } = submitted();
    const review = story.review('sentBack', state.headHash, ['b']);
    const old = (entries[1] as FoldEntry).body.id;
    const bad = story.answer(1, 'b', { kind: 'note', text: '' }, old);
    const good = story.answer(1, 'b', WORDS, bad.body.id);
    const stillOpen = apply(state, review, bad);
    expect(stillOpen.steps['b']?.reopenedBy).toBe(review.body.id);
    const answered = apply(stillOpen, good);
    expect(answered.steps['b']).toMatchObject({ reopenedBy: null, counts: true, answeredTwice: false });
    expect(answered.state).toBe('sentBack');
    expect(apply(answered, story.submission(1))).toMatchObject({ state: 'submitted', round: 2 });
  });

  it('is not overtaken by a submission made before it', () => {
    const { story, state } = submitted();
    const second = apply(state, story.submission(1));
    const back = apply(second, story.review('sentBack', state.headHash, ['b']));
    const answered = apply(back, story.answer(1, 'b', WORDS));
    expect(answered).toMatchObject({ state: 'sentBack', pending: [] });
  });

  it('is answered by saying that the step does not apply', () => {
    const { story, state } = submitted();
    const back = apply(state, story.review('sentBack', state.headHash, ['a']));
    expect(missing(apply(back, story.notApplicable(1, 'a')))).toEqual([]);
  });

  it('that withdraws an approval leaves a submitted sequence without an approved head', () => {
    const { story, state } = submitted();
    const approved = apply(state, story.review('approved', state.headHash));
    const withdrawn = apply(approved, story.review('withdrawn', approved.headHash));
    expect(withdrawn).toMatchObject({ state: 'submitted', approvedHead: null, round: 3 });
  });
});

describe('an entry outside the fold', () => {
  it('that is late counts as such, moves the head and changes nothing else', () => {
    const { story, state } = submitted();
    const approved = apply(state, story.review('approved', state.headHash));
    const late = stored([standing(story.answer(2, 'a'), 'late')], 5);
    const after = apply(approved, ...late);
    expect(after).toMatchObject({ state: 'approved', lateCount: 1, headHash: hashOf(5), headPosition: 5 });
    expect(after.approvedHead).toBe(approved.approvedHead);
    expect(after.steps).toEqual(approved.steps);
    expect(after.recorders).toEqual(approved.recorders);
  });

  it('that is held satisfies no step and makes nobody a recorder', () => {
    const story = new Story(STEPS);
    const held = foldEntries([standing(story.answer(1, 'a'), 'held')], STEPS);
    expect(held).toMatchObject({ heldCount: 1, lateCount: 0, recorders: [], steps: {} });
    expect(missing(held)).toEqual(['a', 'b']);
  });

  it('submits nothing when it is a late submission', () => {
    const { story, state } = submitted();
    const approved = apply(state, story.review('approved', state.headHash));
    expect(apply(approved, standing(story.submission(2), 'late'))).toMatchObject({
      state: 'approved',
      pending: [],
    });
  });

  it('has ids that stay apart from those in the fold', () => {
    const { story, state } = submitted();
    const held = standing(story.answer(2, 'a'), 'held');
    expect(apply(state, held).steps['a']?.entryId).toBe(entryId(1));
  });
});
