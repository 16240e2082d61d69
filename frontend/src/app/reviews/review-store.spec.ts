import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import type { Signature } from '#shared/checklist/signature';
import type { ReviewRequest, SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { PasswordAgain } from '../session/password-again';
import { Session } from '../session/session';
import { ReviewsApi } from './reviews-api';
import { ReviewStore } from './review-store';
import { VerdictSender } from './verdict-sender';

const ID = 's1' as SequenceId;
const signature: Signature = { printedName: 'Inés', width: 1, height: 1, strokes: [], typed: true };

function sequenceWith(headHash: string, state = 'submitted', recorders: string[] = []): SequenceDetail {
  return {
    id: ID,
    openingId: 'o1',
    stepList: { steps: [{ key: 'a', kind: 'note' }], facts: {}, sections: [] },
    fold: { state, headHash, recorders, round: 1 },
    entries: [],
    people: [],
    photos: [],
  } as unknown as SequenceDetail;
}

const failure = (code: string) => ({
  status: 409,
  error: { type: '', title: '', status: 409, detail: '', code, places: [], facts: {}, requestId: '' },
});

describe('ReviewStore', () => {
  let answer: SequenceDetail;
  let verdicts: ReviewRequest[];
  let failures: unknown[];
  let asked: number;
  let waiting: unknown[];
  let store: ReviewStore;
  const settle = (): Promise<unknown> => new Promise((done) => setTimeout(done));

  beforeEach(async () => {
    sessionStorage.clear();
    answer = sequenceWith('h1');
    verdicts = [];
    failures = [];
    asked = 0;
    waiting = [];
    const api = {
      sequence: async () => answer,
      queue: async () => ({ items: waiting, isCut: false }),
      review: async (_id: SequenceId, request: ReviewRequest) => {
        verdicts.push(request);
        if (failures.length > 0) throw failures.shift();
      },
    };
    TestBed.configureTestingModule({
      providers: [
        ReviewStore,
        VerdictSender,
        { provide: ReviewsApi, useValue: api },
        { provide: Session, useValue: { may: () => true, me: () => ({ id: 'ines', name: 'Inés' }) } },
        { provide: PasswordAgain, useValue: { ask: async () => ++asked > 0 } },
      ],
    });
    store = TestBed.inject(ReviewStore);
    store.sequenceId.set(ID);
    TestBed.tick();
    await settle();
    TestBed.tick();
  });

  it('approves exactly the head that is on the screen', async () => {
    store.setMode('approve');
    store.signature.set(signature);
    await store.approve();
    expect(verdicts).toEqual([{ verdict: 'approved', headHash: 'h1', signature }]);
    expect(store.given()).toBe('approved');
  });

  it('asks for the password when the server wants it, and signs then', async () => {
    failures = [failure('passwordNeeded')];
    store.signature.set(signature);
    await store.approve();
    expect(asked).toBe(1);
    expect(verdicts).toHaveLength(2);
    expect(store.given()).toBe('approved');
  });

  it('keeps remarks and drops the signature when it changed meanwhile', async () => {
    store.setRemark('a', 'Show the drain');
    store.setMode('approve');
    store.signature.set(signature);
    expect(store.isChanged()).toBe(false);
    failures = [failure('changedMeanwhile')];
    answer = sequenceWith('h2');
    await store.approve();
    await settle();
    TestBed.tick();
    expect(store.isChanged()).toBe(true);
    expect(store.signature()).toBeNull();
    expect(store.mode()).toBe('closed');
    expect(store.drafts()).toEqual({ a: 'Show the drain' });
    expect(store.given()).toBeNull();
  });

  it('says nothing of a change when it was read again with the same head', async () => {
    store.setMode('approve');
    store.signature.set(signature);
    expect(store.isChanged()).toBe(false);
    store.readAnew();
    await settle();
    TestBed.tick();
    expect(store.isChanged()).toBe(false);
    expect(store.signature()).toEqual(signature);
  });

  it('sends back only with remarks', async () => {
    await store.sendBack();
    expect(verdicts).toEqual([]);
    store.setRemark('a', ' Show the drain ');
    await store.sendBack();
    expect(verdicts).toEqual([
      { verdict: 'sentBack', headHash: 'h1', remarks: [{ stepKey: 'a', text: 'Show the drain' }] },
    ]);
    expect(store.drafts()).toEqual({});
  });

  it('lets go of a verdict as soon as the circuit is submitted again', async () => {
    store.setRemark('a', 'Show the drain');
    answer = sequenceWith('h2', 'sentBack');
    await store.sendBack();
    await settle();
    TestBed.tick();
    expect(store.given()).toBe('sentBack');
    expect(store.isChanged()).toBe(false);
    answer = sequenceWith('h5');
    store.readAnew();
    await settle();
    TestBed.tick();
    expect(store.given()).toBeNull();
    expect(store.isSubmittedAgain()).toBe(true);
    store.acknowledgeChange();
    expect(store.isChanged()).toBe(false);
  });

  it('offers what waits next after a verdict, without what the reader recorded', async () => {
    const item = (sequenceId: string, fourEyesBlocked: boolean) => ({
      sequenceId,
      fourEyesBlocked,
      outsideCount: 0,
      submittedAt: '2026-11-30T10:00:00.000Z',
      code: sequenceId,
    });
    waiting = [item('s1', false), item('s2', true), item('s3', false)];
    expect(store.next()).toBeNull();
    store.signature.set(signature);
    await store.approve();
    TestBed.tick();
    await settle();
    TestBed.tick();
    expect(store.next()?.sequenceId).toBe('s3');
  });

  it('says what the server finds lacking', async () => {
    failures = [
      { ...failure('wrongState'), error: { ...failure('wrongState').error, facts: { missing: ['a'] } } },
    ];
    store.setMode('approve');
    store.signature.set(signature);
    await store.approve();
    expect(store.lacking()?.steps.map(({ key }) => key)).toEqual(['a']);
    expect(store.given()).toBeNull();
  });

  it('gives no verdict on evidence of their own', async () => {
    answer = sequenceWith('h1', 'submitted', ['ines']);
    store.readAnew();
    await settle();
    TestBed.tick();
    expect(store.bar()).toBe('fourEyes');
    expect(store.canReview()).toBe(false);
  });
});
