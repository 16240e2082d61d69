import { describe, expect, it } from '@jest/globals';
import { plainJudgement, type Outcome } from '#shared/checklist/judgement';
import type { Step } from '#shared/checklist/step';
import type { PersonId } from '#shared/plant/ids';
import type { StepDraft } from '../steps/step-draft';
import { localView } from './local-view';
import { bodyOf, cachedOf, CONFIRMED, confirmStep, contentOf, storedOf, uuid } from './sequence.fixture';
import { whyNot } from './record-problem';
import {
  actionKey,
  secondLook,
  sheetMode,
  showsRecorded,
  standingOverrides,
  startingAnswer,
} from './step-action';
import { firstOpenStep, jointOf, markOf, nextOpenStep } from './step-order';

const STEPS = [
  confirmStep('a'),
  confirmStep('note', { required: false }),
  confirmStep('b'),
  confirmStep('c'),
];
const overrideStep = (key: string): Step =>
  ({
    ...confirmStep(key),
    kind: 'override',
    subject: { en: 'Defrost held off', es: 'Deshielo detenido' },
  }) as Step;
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

describe('a set override', () => {
  const steps = [
    overrideStep('hold'),
    confirmStep('b'),
    { ...confirmStep('sign'), kind: 'signature' } as Step,
  ];
  const set = storedOf(
    1,
    bodyOf(
      1,
      contentOf(
        'hold',
        { kind: 'override', phase: 'set', remark: '' },
        { ...plainJudgement('recorded'), counts: false },
      ),
    ),
  );
  const view = localView(cachedOf(steps, [set, done(2, 'b')]), []);

  it('never makes the one big button mean the opposite: it goes on', () => {
    const mode = sheetMode(view.steps[0]!, false, false);
    expect(mode).toBe('standing');
    expect(actionKey('override', mode, false)).toBe('work.nextOpen');
  });

  it('stands until it is put back', () => {
    expect(standingOverrides(view).map(({ step }) => step.key)).toEqual(['hold']);
  });

  it('comes before anybody signs', () => {
    expect(nextOpenStep(view, 'b')).toBe('hold');
    expect(nextOpenStep(view, 'hold')).toBe('sign');
  });

  it('keeps the signature from being recorded, and says why', () => {
    const draft = { lacking: () => null, refusals: () => [] } as unknown as StepDraft;
    expect(whyNot('signature', draft, standingOverrides(view), 'en')).toEqual({
      key: 'work.putBackFirst',
      params: { subject: 'Defrost held off' },
    });
    expect(whyNot('confirm', draft, standingOverrides(view), 'en')).toBeNull();
  });
});

describe('secondLook', () => {
  const outside = plainJudgement('outside');

  it('asks about what lies outside and about what looks odd, and about nothing else', () => {
    expect(secondLook('reading', outside)).toBe('outside');
    expect(secondLook('choose', outside)).toBe('finding');
    const odd = plainJudgement('within', [{ kind: 'liquidRisk', severity: 'ask' }]);
    expect(secondLook('superheat', odd)).toBe('doubt');
    expect(secondLook('reading', plainJudgement('within'))).toBeNull();
    const early = plainJudgement('recorded', [{ kind: 'preliminary', severity: 'keep' }]);
    expect(secondLook('superheat', early)).toBe('preliminary');
    expect(secondLook('superheat', plainJudgement('within'), true)).toBe('unsettled');
    expect(secondLook('reading', null)).toBeNull();
  });

  it('is answered on a button that says so', () => {
    expect(actionKey('reading', 'ask', true)).toBe('work.action_asTyped');
    expect(actionKey('reading', 'ask', false)).toBe('work.action_reading');
  });
});

describe('markOf', () => {
  const answered = (outcome: Outcome) =>
    localView(
      cachedOf(STEPS, [storedOf(1, bodyOf(1, contentOf('a', CONFIRMED, plainJudgement(outcome))))]),
      [],
    );

  it('tells outside and not applicable from what is simply done', () => {
    const marks = (['outside', 'notApplicable', 'within'] as const).map((outcome) =>
      markOf(answered(outcome).steps[0]!),
    );
    expect(marks).toEqual(['outside', 'notApplicable', null]);
    expect(markOf(reopened().steps[2]!)).toBeNull();
  });
});
