import { describe, expect, it } from '@jest/globals';
import { buildStep } from '../checklist/step.fixture';
import type { Answer } from '../checklist/step';
import { confirmStep, hashOf, override, overrideStep, Story } from './entries.fixture';
import { foldEntries, missingSteps } from './fold';

const signatureStep = buildStep('signature', { key: 'sign' });
const STEPS = [
  confirmStep('fan'),
  overrideStep('hold'),
  buildStep('note', { key: 'words', required: false }),
  signatureStep,
];
const SIGN: Answer = {
  kind: 'signature',
  signature: { printedName: 'June', width: 10, height: 10, strokes: [[1, 1, 5, 5]], typed: false },
};
const keysMissing = (entries: ReturnType<Story['answer']>[]): string[] =>
  missingSteps(foldEntries(entries, STEPS), STEPS).map((step) => step.key);

function signedStory(): { story: Story; entries: ReturnType<Story['answer']>[] } {
  const story = new Story(STEPS);
  const entries = [
    story.answer(1, 'fan'),
    story.answer(1, 'hold', override('set')),
    story.answer(1, 'hold', override('putBack')),
    story.answer(1, 'sign', SIGN),
  ];
  return { story, entries };
}

describe('a signature', () => {
  it('stands while nothing is recorded after it', () => {
    expect(keysMissing(signedStory().entries)).toEqual([]);
  });

  it('is asked again once an override is set and put back after it', () => {
    const { story, entries } = signedStory();
    entries.push(story.answer(1, 'hold', override('set')), story.answer(1, 'hold', override('putBack')));
    expect(keysMissing(entries)).toEqual(['sign']);
    entries.push(story.answer(1, 'sign', SIGN));
    expect(keysMissing(entries)).toEqual([]);
  });

  it('is asked again after a step was found not applicable, and after another phone recorded', () => {
    const { story, entries } = signedStory();
    expect(keysMissing([...entries, story.notApplicable(1, 'fan')])).toEqual(['sign']);
    expect(keysMissing([...entries, story.answer(2, 'fan')])).toEqual(['sign']);
  });

  it('stands beside a note: that is a word, not work', () => {
    const { story, entries } = signedStory();
    expect(keysMissing([...entries, story.answer(1, 'words', { kind: 'note', text: 'Cold.' })])).toEqual([]);
  });

  it('stands when what was recorded before it on the same phone arrives later', () => {
    const [fan, ...others] = signedStory().entries;
    expect(keysMissing([...others, fan as (typeof others)[number]])).toEqual([]);
  });
});

describe('a new expansion', () => {
  it('asks again what it changed, the signature not included, and leaves the rest', () => {
    const { story, entries } = signedStory();
    const again = story.expansion(hashOf(7), ['fan', 'never-answered']);
    const fold = foldEntries([...entries, again], STEPS);
    expect(fold.steps['fan']?.reopenedBy).toBe(again.body.id);
    expect(fold.steps['sign']?.reopenedBy).toBeNull();
    expect(Object.keys(fold.steps)).not.toContain('never-answered');
    expect(keysMissing([...entries, again])).toEqual(['fan']);
    // The new reading comes after the signature, which then has to stand under it.
    expect(keysMissing([...entries, again, story.answer(1, 'fan')])).toEqual(['sign']);
  });
});
