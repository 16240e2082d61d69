import { describe, expect, it } from '@jest/globals';
import type { PersonId } from '#shared/plant/ids';
import { localView } from './local-view';
import { bodyOf, cachedOf, CONFIRMED, confirmStep, contentOf, storedOf, uuid } from './sequence.fixture';
import { firstOpenStep, jointOf, nextOpenStep } from './step-order';
import { actionKey, showsRecorded, startingAnswer } from './step-action';

const STEPS = [
  confirmStep('a'),
  confirmStep('note', { required: false }),
  confirmStep('b'),
  confirmStep('c'),
];
const done = (position: number, key: string) =>
  storedOf(position, bodyOf(position, contentOf(key, CONFIRMED)));
const sentBack = (position: number, key: string) =>
  storedOf(
    position,
    bodyOf(
      position,
      {
        kind: 'review',
        verdict: 'sentBack',
        headHash: 'a'.repeat(64),
        remarks: [{ stepKey: key, text: 'Read it again' }],
        signature: null,
        meaning: null,
      },
      { deviceId: null, authorId: uuid(9) as PersonId },
    ),
  );

const reopened = () => {
  const all = [done(1, 'a'), done(2, 'b'), done(3, 'c')];
  const submission = storedOf(4, bodyOf(4, { kind: 'submission', restsOn: [] }));
  return localView(cachedOf(STEPS, [...all, submission, sentBack(5, 'b')]), []);
};

describe('firstOpenStep', () => {
  it('is the first required step that is not done', () => {
    expect(firstOpenStep(localView(cachedOf(STEPS, [done(1, 'a')]), []))).toBe('b');
  });

  it('is null when only steps that are not required are open', () => {
    const view = localView(cachedOf(STEPS, [done(1, 'a'), done(2, 'b'), done(3, 'c')]), []);
    expect(firstOpenStep(view)).toBeNull();
  });

  it('is the step that a lead asks for again, before anything else', () => {
    expect(firstOpenStep(reopened())).toBe('b');
  });
});

describe('nextOpenStep', () => {
  it('offers a step that is not required on the way', () => {
    expect(nextOpenStep(localView(cachedOf(STEPS, [done(1, 'a')]), []), 'a')).toBe('note');
  });

  it('comes back to a required step that was passed over', () => {
    expect(nextOpenStep(localView(cachedOf(STEPS, [done(1, 'c')]), []), 'c')).toBe('a');
  });

  it('does not lead back to a step that is not required', () => {
    const view = localView(cachedOf(STEPS, [done(1, 'a'), done(2, 'b'), done(3, 'c')]), []);
    expect(nextOpenStep(view, 'c')).toBeNull();
  });
});

describe('a reopened step', () => {
  const step = () => reopened().steps[2]!;

  it('breaks the copper line', () => {
    expect(jointOf(step(), 'b').state).toBe('sentBack');
    expect(jointOf(reopened().steps[0]!, 'a').state).toBe('approved');
    expect(jointOf(reopened().steps[1]!, 'note').state).toBe('open');
  });

  it('asks anew and starts empty', () => {
    expect(showsRecorded(step(), false)).toBe(false);
    expect(startingAnswer(step())).toBeNull();
  });

  it('starts a correction of any other step from what was recorded', () => {
    expect(showsRecorded(reopened().steps[0]!, false)).toBe(true);
    expect(startingAnswer(reopened().steps[0]!)).toEqual(CONFIRMED);
  });
});

describe('actionKey', () => {
  it('says that an odd answer is recorded as it stands', () => {
    expect(actionKey(reopened().steps[0]!, true)).toBe('work.action_asTyped');
    expect(actionKey(reopened().steps[0]!, false)).toBe('work.action_confirm');
  });
});
