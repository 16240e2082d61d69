import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { Title } from '@angular/platform-browser';
import { provideRouter } from '@angular/router';
import { NEVER } from 'rxjs';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { Connectivity } from '../offline/connectivity';
import { PasswordAgain } from '../session/password-again';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { PageTitles } from '../shell/page-titles';
import { withWords } from '../ui/words/with-words.fixture';
import { ReviewPage } from './review-page';
import { ReviewsApi } from './reviews-api';

const text = (en: string) => ({ en, es: en });
const step = (key: string) => ({
  kind: 'note',
  key,
  section: 'x',
  title: text(`Note ${key}`),
  instruction: null,
  caution: null,
  required: true,
  source: null,
});

const sequence = {
  id: 's1',
  openingId: 'o1',
  openingName: 'Juniper Street',
  timeZone: 'America/Denver',
  specification: {
    revision: 1,
    circuit: { code: 'A1', description: 'Dairy', area: 'Sales floor', fixtures: [] },
    system: { name: 'Rack A', refrigerant: 'R-448A' },
    suctionGroup: { name: 'Medium' },
  },
  stepList: { steps: [step('a'), step('b')], facts: { unitSystem: 'us' }, sections: [] },
  fold: { state: 'submitted', headHash: 'h1', recorders: [], round: 1, steps: {}, arrived: {}, pending: [] },
  entries: [],
  people: [],
  photos: [],
} as unknown as SequenceDetail;

describe('ReviewPage', () => {
  let fixture: ComponentFixture<ReviewPage>;
  let review: jest.Mock<() => Promise<void>>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const byId = (id: string): HTMLElement => document.getElementById(id)!;
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    await fixture.whenStable();
  };
  const button = (words: string): HTMLButtonElement =>
    [...root().querySelectorAll('button')].find((one) => one.textContent?.trim().startsWith(words))!;
  async function press(words: string): Promise<void> {
    button(words).click();
    await settle();
  }

  beforeEach(async () => {
    sessionStorage.clear();
    document.body.replaceChildren();
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    review = jest.fn<() => Promise<void>>().mockResolvedValue();
    const api = {
      sequence: async () => sequence,
      queue: async () => ({ items: [], isCut: false }),
      review,
      photoUrl: () => '',
    };
    TestBed.configureTestingModule({
      imports: [ReviewPage, withWords()],
      providers: [
        provideRouter([]),
        { provide: ReviewsApi, useValue: api },
        {
          provide: Session,
          useValue: { may: () => true, me: () => ({ id: 'ines', name: 'Inés', language: 'en' }) },
        },
        { provide: PasswordAgain, useValue: { ask: async () => true } },
        { provide: LiveEvents, useValue: { on: () => NEVER } },
        { provide: Connectivity, useValue: { online: signal(true) } },
      ],
    });
    fixture = TestBed.createComponent(ReviewPage);
    document.body.append(root());
    fixture.componentRef.setInput('sequenceId', 's1');
    await settle();
    await settle();
  });

  it('leads the keyboard into the panel, and back to the button that opened it', async () => {
    await press('Approve');
    expect(document.activeElement).toBe(byId('verdict-title'));
    await press('Not yet');
    expect(document.activeElement).toBe(button('Approve'));
    await press('Send back');
    expect(document.activeElement).toBe(byId('verdict-title'));
    await press('Not yet');
    expect(document.activeElement).toBe(button('Send back'));
  });

  it('goes from a remark back to the button of its step at Escape', async () => {
    const box = root().querySelector('textarea')!;
    box.focus();
    box.dispatchEvent(new KeyboardEvent('keydown', { key: 'Escape', bubbles: true }));
    await settle();
    expect(document.activeElement).toBe(byId('step-a'));
  });

  it('goes to what is said about the verdict once it is given', async () => {
    const box = root().querySelector('textarea')!;
    box.value = 'Show the drain';
    box.dispatchEvent(new Event('input'));
    await press('Send back');
    button('Send back with remarks').focus();
    await press('Send back with remarks');
    expect(review).toHaveBeenCalledTimes(1);
    expect(document.activeElement).toBe(byId('review-told'));
  });

  it('keeps the keyboard on the button while the verdict is on its way, and when it fails', async () => {
    let fail: () => void = () => undefined;
    review.mockReturnValue(
      new Promise((_done, refuse) => {
        fail = () => refuse({ name: 'HttpErrorResponse', status: 0 });
      }),
    );
    const box = root().querySelector('textarea')!;
    box.value = 'Show the drain';
    box.dispatchEvent(new Event('input'));
    await press('Send back');
    button('Send back with remarks').focus();
    await press('Send back with remarks');
    expect(button('Send back with remarks').disabled).toBe(false);
    expect(document.activeElement).toBe(button('Send back with remarks'));
    fail();
    await settle();
    expect(root().querySelector('app-problem')).not.toBeNull();
    expect(document.activeElement).toBe(button('Send back with remarks'));
  });

  it('names the circuit in the title of the window', async () => {
    TestBed.inject(PageTitles);
    await settle();
    expect(TestBed.inject(Title).getTitle()).toBe('A1 · Review · Firstcold');
  });
});
