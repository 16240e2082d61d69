import { describe, expect, it, jest } from '@jest/globals';
import { LiveAnnouncer } from '@angular/cdk/a11y';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Subject } from 'rxjs';
import type { QueueItem } from '#shared/contracts/review-queue';
import { Connectivity } from '../offline/connectivity';
import { LiveEvents } from '../shell/live-events';
import { withWords } from '../ui/words/with-words.fixture';
import { QueuePage } from './queue-page';
import { ReviewsApi } from './reviews-api';

const item = (code: string, change: Partial<QueueItem> = {}): QueueItem =>
  ({
    sequenceId: code,
    level: 'circuit',
    openingId: 'o',
    openingName: 'Juniper Street',
    openingDate: '2026-12-10',
    code,
    description: 'Dairy',
    area: 'Sales floor',
    submittedAt: '2026-11-30T10:00:00.000Z',
    submittedBy: 'Marco Ruiz',
    round: 1,
    stepsTotal: 12,
    outsideCount: 0,
    notApplicableCount: 0,
    answeredTwiceCount: 0,
    photoCount: 3,
    lateCount: 0,
    fourEyesBlocked: false,
    ...change,
  }) as unknown as QueueItem;

async function open(first: readonly QueueItem[]) {
  const events = new Subject<unknown>();
  const announce = jest.fn<(sentence: string, politeness: string) => Promise<void>>().mockResolvedValue();
  const answer = { items: first };
  TestBed.configureTestingModule({
    imports: [QueuePage, withWords()],
    providers: [
      provideRouter([]),
      { provide: ReviewsApi, useValue: { queue: async () => ({ items: answer.items, isCut: false }) } },
      { provide: LiveEvents, useValue: { on: () => events } },
      { provide: LiveAnnouncer, useValue: { announce } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(QueuePage);
  await fixture.whenStable();
  return { fixture, root: fixture.nativeElement as HTMLElement, events, announce, answer };
}

describe('QueuePage', () => {
  it('says what waits where it is the work of a suction group', async () => {
    const { root } = await open([item('Rack A AS-1', { level: 'suctionGroup', description: '', area: '' })]);
    const what = [...root.querySelectorAll('.what p')].map((line) => line.textContent?.trim());
    expect(what).toEqual(['Suction group', 'Juniper Street']);
  });

  it('says that a second person reviews what the reader recorded', async () => {
    const { root } = await open([item('A1', { fourEyesBlocked: true })]);
    expect(root.textContent).toContain('Recorded by you: a second person reviews this.');
  });

  it('brings in what was submitted meanwhile and announces it politely', async () => {
    const { root, fixture, events, announce, answer } = await open([item('A1')]);
    expect(announce).not.toHaveBeenCalled();
    answer.items = [item('A1'), item('A2', { outsideCount: 2 })];
    events.next({ kind: 'sequenceChanged' });
    await new Promise((done) => setTimeout(done, 900));
    await fixture.whenStable();
    const codes = [...root.querySelectorAll('.code')].map((code) => code.textContent?.trim());
    expect(codes).toEqual(['A2', 'A1']);
    expect(announce).toHaveBeenCalledWith('1 new circuit in the review queue', 'polite');
  });

  it('says what an empty queue waits for', async () => {
    const { root } = await open([]);
    expect(root.textContent).toContain('Nothing waits for review');
  });
});
