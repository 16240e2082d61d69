import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import type { Judgement } from '../checklist/judgement';
import type { Step } from '../checklist/step';
import { CHAIN_START } from './chain';
import {
  confirmStep,
  deepFreeze,
  deviceId,
  entryId,
  hashOf,
  noteStep,
  override,
  overrideStep,
  personId,
  standing,
  stored,
  Story,
} from './entries.fixture';
import { applyEntry, emptyFold, foldEntries, hasArrived, missingSteps, type FoldEntry } from './fold';
import { foldStateSchema } from './fold-state';

const STEPS: readonly Step[] = [
  confirmStep('a'),
  confirmStep('b'),
  overrideStep('hold'),
  confirmStep('extra', { required: false }),
];

const keys = (state: ReturnType<typeof emptyFold>, steps = STEPS) =>
  missingSteps(state, steps).map((step) => step.key);

describe('foldEntries', () => {
  it('begins open, at the start of the chain, in the first round', () => {
    const state = foldEntries([], STEPS);
    expect(state).toMatchObject({ state: 'open', round: 1, headHash: CHAIN_START, headPosition: 0 });
    expect(keys(state)).toEqual(['a', 'b', 'hold']);
  });

  it('takes the head from what is stored, and leaves it for what is not sent yet', () => {
    const story = new Story(STEPS);
    const [first, second] = [story.answer(1, 'a'), story.answer(1, 'b')];
    const state = foldEntries([...stored([first]), second], STEPS);
    expect(state).toMatchObject({ headHash: hashOf(1), headPosition: 1 });
    expect(Object.keys(state.steps)).toEqual(['a', 'b']);
  });

  it('follows the server’s judgement where there is one, and the device’s where not', () => {
    const mine = new Story(STEPS).answer(1, 'a');
    const judgement: Judgement = {
      outcome: 'outside',
      side: null,
      counts: false,
      doubts: [],
      figures: [],
      limit: null,
      working: [],
    };
    expect(foldEntries([mine], STEPS).steps['a']).toMatchObject({ outcome: 'recorded', counts: true });
    const judged: FoldEntry = { ...mine, server: { ...mine.server, judgement } };
    expect(foldEntries([judged], STEPS).steps['a']).toMatchObject({ outcome: 'outside', counts: false });
  });

  it('counts a step that was said not to apply', () => {
    const state = foldEntries([new Story(STEPS).notApplicable(1, 'a')], STEPS);
    expect(state.steps['a']).toMatchObject({ outcome: 'notApplicable', counts: true });
    expect(keys(state)).toEqual(['b', 'hold']);
  });

  it('lists whoever recorded or submitted once, and not who reviewed', () => {
    const story = new Story(STEPS);
    const entries = [
      story.answer(1, 'a'),
      story.answer(1, 'b'),
      story.notApplicable(2, 'extra'),
      story.submission(3),
      story.review('sentBack', hashOf(1), ['a']),
    ];
    expect(foldEntries(entries, STEPS).recorders).toEqual([personId(1), personId(2), personId(3)]);
  });

  it('tells of two answers where the second author had not seen the first', () => {
    const story = new Story(STEPS);
    const [first, blind] = [story.answer(1, 'a'), story.answer(2, 'a')];
    const twice = foldEntries([first, blind], STEPS);
    expect(twice.steps['a']).toMatchObject({ entryId: blind.body.id, answeredTwice: true });
    const corrected = story.answer(1, 'a', undefined, blind.body.id);
    expect(foldEntries([first, blind, corrected], STEPS).steps['a']).toMatchObject({ answeredTwice: false });
  });

  it('lets a correction that does not count open the step again', () => {
    const steps: Step[] = [noteStep('n')];
    const story = new Story(steps);
    const good = story.answer(1, 'n', { kind: 'note', text: 'Words' });
    const empty = story.answer(1, 'n', { kind: 'note', text: ' ' }, good.body.id);
    expect(keys(foldEntries([good], steps), steps)).toEqual([]);
    expect(keys(foldEntries([good, empty], steps), steps)).toEqual(['n']);
  });

  it('keeps what was recorded when the sequence is expanded anew', () => {
    const story = new Story(STEPS);
    const entries = [story.expansion(hashOf(7)), story.answer(1, 'a'), story.expansion(hashOf(8))];
    const state = foldEntries(entries, [...STEPS, confirmStep('new')]);
    expect(state.stepListHash).toBe(hashOf(8));
    expect(state.steps['a']?.counts).toBe(true);
    expect(keys(state, [...STEPS, confirmStep('new')])).toEqual(['b', 'hold', 'new']);
    expect(state.arrived).toEqual({ [deviceId(1)]: { upTo: 1, beyond: [] } });
  });

  it.each(['constructor', '__proto__', 'toString'])('takes the step key %s for any other', (key) => {
    const state = foldEntries([new Story(STEPS).answer(1, 'a'), new Story(STEPS).answer(2, key)], STEPS);
    expect(Object.getPrototypeOf(state.steps)).toBe(Object.prototype);
    expect(Object.keys(state.steps)).toEqual(['a', key]);
  });
});

describe('an override', () => {
  const steps = [overrideStep('hold'), { ...overrideStep('fan'), required: false }];
  const done = (story: Story) => story.answer(1, 'hold', override('putBack'));

  it('stands until it is put back, and keeps a submission waiting as long', () => {
    const story = new Story(steps);
    const set = story.answer(1, 'fan', override('set'));
    const back = story.answer(1, 'fan', override('putBack'), set.body.id);
    const before = [done(story), set];
    expect(keys(foldEntries(before, steps), steps)).toEqual(['fan']);
    const waiting = foldEntries([...before, story.submission(1, [])], steps);
    expect(waiting).toMatchObject({ state: 'open', pending: [{ restsOn: [] }] });
    expect(applyEntry(waiting, back, steps)).toMatchObject({ state: 'submitted', pending: [] });
  });

  it('stands even where its step is not required', () => {
    const story = new Story(steps);
    const state = foldEntries([done(story), story.answer(1, 'fan', override('set'))], steps);
    expect(state.steps['fan']).toMatchObject({ overrideStanding: true, counts: false });
    expect(keys(state, steps)).toEqual(['fan']);
  });
});

describe('hasArrived', () => {
  const after = (...entries: FoldEntry[]) => foldEntries(entries, []);

  it('is true for a submission that rests on nothing, and false for a device never heard of', () => {
    expect(hasArrived(emptyFold(), [])).toBe(true);
    expect(hasArrived(emptyFold(), [{ deviceId: deviceId(1), count: 0 }])).toBe(true);
    expect(hasArrived(emptyFold(), [{ deviceId: deviceId(1), count: 1 }])).toBe(false);
  });

  it('takes counts in any order, and a gap holds up what lies behind it', () => {
    const story = new Story([]);
    const [one, two, three, four] = ['a', 'b', 'c', 'd'].map((key) => story.answer(1, key)) as [
      FoldEntry,
      FoldEntry,
      FoldEntry,
      FoldEntry,
    ];
    const gap = after(four, two, one);
    expect(gap.arrived[deviceId(1)]).toEqual({ upTo: 2, beyond: [4] });
    expect(hasArrived(gap, [{ deviceId: deviceId(1), count: 3 }])).toBe(false);
    expect(applyEntry(gap, three, []).arrived[deviceId(1)]).toEqual({ upTo: 4, beyond: [] });
  });

  it('counts each device by itself, and the same entry once', () => {
    const story = new Story([]);
    const [mine, yours] = [story.answer(1, 'a'), story.answer(2, 'b')];
    expect(after(mine, mine, yours).arrived).toEqual({
      [deviceId(1)]: { upTo: 1, beyond: [] },
      [deviceId(2)]: { upTo: 1, beyond: [] },
    });
  });

  it('counts entries that are late or held: they did arrive', () => {
    const story = new Story([]);
    const state = after(standing(story.answer(1, 'a'), 'late'), standing(story.answer(1, 'b'), 'held'));
    expect(hasArrived(state, [{ deviceId: deviceId(1), count: 2 }])).toBe(true);
  });

  it('does not count what the server made', () => {
    expect(after(new Story([]).expansion(hashOf(1))).arrived).toEqual({});
  });
});

describe('applyEntry', () => {
  const frozenSteps = deepFreeze(structuredClone(STEPS));

  /** A long story in which everything happens: two phones, corrections, a verdict, late and held entries. */
  const anyEntries = fc
    .array(
      fc.record({
        device: fc.constantFrom(1, 2),
        what: fc.constantFrom(
          'a',
          'b',
          'extra',
          'set',
          'putBack',
          'na',
          'submit',
          'back',
          'approve',
          'expand',
        ),
        standing: fc.constantFrom('inOrder', 'inOrder', 'inOrder', 'late', 'held' as const),
      }),
      { maxLength: 30 },
    )
    .map((acts) => {
      const story = new Story(STEPS);
      return stored(
        acts.map(({ device, what, standing: where }) => {
          if (what === 'submit') return standing(story.submission(device), where);
          if (what === 'back') return story.review('sentBack', hashOf(1), ['a', 'extra']);
          if (what === 'approve') return story.review('approved', hashOf(1));
          if (what === 'expand') return story.expansion(hashOf(5));
          if (what === 'na') return standing(story.notApplicable(device, 'b'), where);
          if (what === 'set' || what === 'putBack')
            return standing(story.answer(device, 'hold', override(what)), where);
          return standing(story.answer(device, what), where);
        }),
      );
    });

  it('comes to the same state one by one as in one go, and never changes what it is given', () => {
    fc.assert(
      fc.property(anyEntries, fc.nat(30), (entries, cut) => {
        deepFreeze(entries);
        let state = deepFreeze(emptyFold());
        for (const entry of entries) state = deepFreeze(applyEntry(state, entry, frozenSteps));
        expect(state).toEqual(foldEntries(entries, frozenSteps));
        // A server that carries its stored state forward gets where a phone gets that folds everything.
        const kept = foldStateSchema.parse(
          JSON.parse(JSON.stringify(foldEntries(entries.slice(0, cut), frozenSteps))),
        );
        const forward = entries.slice(cut).reduce((now, entry) => applyEntry(now, entry, frozenSteps), kept);
        expect(forward).toEqual(state);
      }),
      { numRuns: 400 },
    );
  });

  it('follows what the server wrote down, whatever steps are asked for by now', () => {
    fc.assert(
      fc.property(anyEntries, (entries) => {
        let state = emptyFold();
        const recorded = entries.map((entry) => {
          state = applyEntry(state, entry, STEPS);
          return { ...entry, server: { ...entry.server, stateAfter: state.state } };
        });
        expect(foldEntries(recorded, STEPS)).toEqual(state);
        const otherSteps = [confirmStep('new'), confirmStep('newer')];
        expect(foldEntries(recorded, otherSteps)).toEqual(state);
        expect(foldEntries(recorded, [])).toEqual(state);
      }),
      { numRuns: 300 },
    );
  });

  it('never has a submitted or approved state while something is missing, unless more came after', () => {
    fc.assert(
      fc.property(anyEntries, (entries) => {
        let before = emptyFold();
        for (const entry of entries) {
          const after = applyEntry(before, entry, STEPS);
          if (after.state === 'submitted' && before.state !== 'submitted') {
            expect(missingSteps(after, STEPS)).toEqual([]);
          }
          if (after.state === 'approved') expect(['submitted', 'approved']).toContain(before.state);
          before = after;
        }
      }),
      { numRuns: 400 },
    );
  });

  it('keeps every entry’s id of the latest answer in order, whatever its device’s clock said', () => {
    const story = new Story(STEPS);
    const early = story.answer(1, 'a');
    const late = {
      ...early,
      body: { ...early.body, id: entryId(50), deviceTime: '1999-01-01T00:00:00.000Z' },
    };
    expect(foldEntries([early, late], STEPS).steps['a']?.entryId).toBe(entryId(50));
  });
});
