import { describe, expect, it } from '@jest/globals';
import type { Step, StepList } from '../checklist/step';
import { buildStep, SEA_LEVEL } from '../checklist/step.fixture';
import {
  confirmStep,
  deepFreeze,
  hashOf,
  noteStep,
  override,
  overrideStep,
  standing,
  Story,
} from './entries.fixture';
import { isDone, viewSequence } from './sequence-view';

const STEPS = [
  confirmStep('a'),
  noteStep('b'),
  overrideStep('hold'),
  buildStep('choose', { key: 'glass' }),
  confirmStep('extra', { required: false }),
];
const WORDS = { kind: 'note', text: 'Words' } as const;

function list(steps: readonly Step[] = STEPS): StepList {
  const title = { en: 'Words', es: 'Palabras' };
  return {
    format: 1,
    template: { key: 'circuit', version: 1, title },
    facts: SEA_LEVEL,
    sections: [{ key: 'a', title }],
    steps: [...steps],
  };
}

const ids = (entries: readonly { readonly body: { readonly id: string } }[]) =>
  entries.map((entry) => entry.body.id);

describe('viewSequence', () => {
  it('shows each step in working order with its history, oldest first, and what counts now', () => {
    const story = new Story(STEPS);
    const [one, other] = [story.answer(1, 'b', WORDS), story.answer(1, 'a')];
    const two = story.answer(1, 'b', WORDS, one.body.id);
    const view = viewSequence(list(), [one, other, two]);
    expect(view.steps.map(({ step }) => step.key)).toEqual(['a', 'b', 'hold', 'glass', 'extra']);
    expect(ids(view.steps[1]?.history ?? [])).toEqual(ids([one, two]));
    expect(view.steps[1]?.current).toBe(two);
    expect(view.steps[4]).toMatchObject({ fold: null, history: [], current: null, remark: null });
  });

  it('counts what is done, what lies outside, and names what is missing', () => {
    const story = new Story(STEPS);
    const view = viewSequence(list(), [
      story.answer(1, 'a'),
      story.answer(1, 'b', { kind: 'note', text: '' }),
      story.answer(1, 'hold', override('set')),
      story.answer(1, 'glass', { kind: 'choose', value: 'bubbles' }),
      story.answer(1, 'extra'),
    ]);
    expect(view.doneCount).toBe(3);
    expect(view.outsideCount).toBe(1);
    expect(view.missing.map((step) => step.key)).toEqual(['b', 'hold']);
  });

  it('keeps entries on steps that are no longer asked for, in order', () => {
    const story = new Story(STEPS);
    const entries = [
      story.answer(1, 'coil.1'),
      story.answer(1, 'a'),
      story.notApplicable(1, 'coil.2'),
      story.answer(1, 'coil.1'),
    ];
    const view = viewSequence(list(), entries);
    expect(ids(view.noLongerAsked).sort()).toEqual(
      ids([entries[0], entries[2], entries[3]] as never[]).sort(),
    );
    expect(view.doneCount).toBe(1);
    expect(viewSequence(list([...STEPS, confirmStep('coil.1')]), entries).noLongerAsked).toHaveLength(1);
  });

  it('shows the lead’s remark on a step until it is answered anew', () => {
    const story = new Story(STEPS);
    const answers = [
      story.answer(1, 'a'),
      story.answer(1, 'b', WORDS),
      story.answer(1, 'hold', override('putBack')),
      story.answer(1, 'glass', { kind: 'choose', value: 'clear' }),
    ];
    const review = story.review('sentBack', hashOf(5), ['b']);
    const before = [...answers, story.submission(1), review];
    const back = viewSequence(list(), before);
    expect(back.fold.state).toBe('sentBack');
    expect(back.steps[1]?.remark).toMatchObject({ text: 'Again: b', stepKey: 'b', entry: review });
    expect(back.steps[0]?.remark).toBeNull();
    expect(back.doneCount).toBe(3);
    const again = viewSequence(list(), [...before, story.answer(1, 'b', WORDS)]);
    expect(again.steps[1]?.remark).toBeNull();
    expect(again.doneCount).toBe(4);
    expect(ids(again.reviews)).toEqual(ids([review]));
  });

  it('shows the lead’s remark on a step that nobody has answered yet', () => {
    const story = new Story(STEPS);
    const entries = [
      story.answer(1, 'a'),
      story.answer(1, 'b', WORDS),
      story.answer(1, 'hold', override('putBack')),
      story.answer(1, 'glass', { kind: 'choose', value: 'clear' }),
      story.submission(1),
      story.review('sentBack', hashOf(5), ['extra']),
    ];
    const view = viewSequence(list(), entries);
    expect(view.fold.state).toBe('sentBack');
    expect(view.steps[4]?.remark).toMatchObject({ text: 'Again: extra' });
    const answered = viewSequence(list(), [...entries, story.answer(1, 'extra')]);
    expect(answered.steps[4]?.remark).toBeNull();
  });

  it('puts late and held entries beside the steps, not into their history', () => {
    const story = new Story(STEPS);
    const [late, held] = [standing(story.answer(1, 'a'), 'late'), standing(story.answer(1, 'a'), 'held')];
    const view = viewSequence(list(), [late, held]);
    expect(view.late).toEqual([late]);
    expect(view.steps[0]).toMatchObject({ history: [], current: null, fold: null });
    expect(view.noLongerAsked).toEqual([]);
  });

  it('shows every entry on a step somewhere: in a history, late, held or no longer asked for', () => {
    const story = new Story(STEPS);
    const entries = [
      story.answer(1, 'a'),
      story.answer(2, 'a'),
      story.answer(1, 'gone'),
      standing(story.answer(1, 'b', WORDS), 'late'),
    ];
    const view = viewSequence(list(), entries);
    const shown = [...view.steps.flatMap((step) => step.history), ...view.noLongerAsked, ...view.late];
    expect(ids(shown).sort()).toEqual(ids(entries).sort());
  });

  it('does not change what it is given', () => {
    const story = new Story(STEPS);
    const entries = deepFreeze([story.answer(1, 'a'), story.submission(1)]);
    expect(viewSequence(deepFreeze(structuredClone(list())), entries).doneCount).toBe(1);
  });
});

describe('isDone', () => {
  const fold = new Story(STEPS);
  const done = viewSequence(list(), [fold.answer(1, 'a')]).steps[0]?.fold;

  it('takes an answer that counts, with nothing standing and nothing asked again', () => {
    expect(isDone(done)).toBe(true);
  });

  it.each([{ counts: false }, { overrideStanding: true }, { reopenedBy: fold.answer(1, 'a').body.id }])(
    'does not take %j',
    (change) => {
      expect(done && isDone({ ...done, ...change })).toBe(false);
    },
  );

  it('does not take a step without an answer', () => {
    expect(isDone(null)).toBe(false);
    expect(isDone(undefined)).toBe(false);
  });
});
