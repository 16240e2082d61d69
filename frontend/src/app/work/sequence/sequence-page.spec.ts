import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatIconTestingModule } from '@angular/material/icon/testing';
import { Title } from '@angular/platform-browser';
import { provideRouter } from '@angular/router';
import { describe, expect, it } from '@jest/globals';
import type { Language } from '#shared/checklist/text';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import { Connectivity } from '../../offline/connectivity';
import { LanguageChoice } from '../../shell/language-choice';
import { PageTitles } from '../../shell/page-titles';
import { withWords } from '../../ui/words/with-words.fixture';
import { localView } from './local-view';
import { SequencePage } from './sequence-page';
import { SequenceStore } from './sequence-store';
import { cachedOf, confirmStep, SEQUENCE } from './sequence.fixture';

const CACHED = cachedOf([confirmStep('a'), confirmStep('b')], []);
const SPECIFICATION = { circuit: { code: 'A12', description: 'Dairy' } };

/** The view after a lead sent it back; `asked` tells which steps are still asked for again. */
function sentBack(asked: readonly string[]): SequenceView {
  const view = localView(CACHED, []);
  const steps = view.steps.map((step): StepView =>
    asked.includes(step.step.key)
      ? ({ ...step, fold: { counts: true, reopenedBy: 'review' } } as unknown as StepView)
      : step,
  );
  const review = { body: { authorId: 'lead' } } as unknown as SequenceView['reviews'][number];
  return { ...view, steps, fold: { ...view.fold, state: 'sentBack' }, reviews: [review] };
}

async function open(at: string, view: SequenceView) {
  const language = signal<Language>('en');
  const store = {
    view: signal(view),
    detail: signal({ ...CACHED.detail, specification: SPECIFICATION }),
    status: signal('ready'),
    problem: signal(null),
    unsentCount: signal(0),
    isSettled: signal(true),
    troubled: signal([]),
    readAt: signal(null),
    nameOf: () => 'Inés Vega',
    open: async () => undefined,
  };
  TestBed.configureTestingModule({
    imports: [SequencePage, MatIconTestingModule, withWords()],
    providers: [
      provideRouter([]),
      { provide: Connectivity, useValue: { online: signal(true) } },
      { provide: LanguageChoice, useValue: { language } },
    ],
  }).overrideComponent(SequencePage, {
    set: { providers: [{ provide: SequenceStore, useValue: store }] },
  });
  TestBed.inject(PageTitles);
  const fixture = TestBed.createComponent(SequencePage);
  fixture.componentRef.setInput('sequenceId', SEQUENCE);
  fixture.componentRef.setInput('at', at);
  await fixture.whenStable();
  const banner = (fixture.nativeElement as HTMLElement).querySelector('.banner');
  return { fixture, banner: banner?.textContent?.trim(), title: () => TestBed.inject(Title).getTitle() };
}

describe('SequencePage', () => {
  it('counts the steps that a lead still asks for again', async () => {
    const { banner } = await open('submit', sentBack(['a', 'b']));
    expect(banner).toBe('Inés Vega sent this back. Steps asked for again: 2.');
  });

  it('says what is left to do once all of them are recorded again', async () => {
    const { banner } = await open('submit', sentBack([]));
    expect(banner).toBe(
      'Inés Vega sent this back. Everything asked for again is recorded; it goes back when you submit it.',
    );
  });

  it('leads to the coil walk where several coils are to be read, and back to it from there', async () => {
    const superheat = { kind: 'superheat', band: { lowK: 3, highK: 6 } } as never;
    const cached = cachedOf([confirmStep('a', superheat), confirmStep('b', superheat)], []);
    const { fixture } = await open('overview', localView(cached, []));
    const page = fixture.nativeElement as HTMLElement;
    const coils = `/work/${SEQUENCE}/coils`;
    expect(page.querySelector('.to-walk')?.getAttribute('href')).toBe(coils);
    expect(page.querySelector('.up')?.getAttribute('href')).toBe('/work');
    fixture.componentRef.setInput('from', 'coils');
    await fixture.whenStable();
    expect(page.querySelector('.up')?.getAttribute('href')).toBe(coils);
  });

  it('offers no coil walk for a single coil', async () => {
    const { fixture } = await open('overview', localView(CACHED, []));
    expect((fixture.nativeElement as HTMLElement).querySelector('.to-walk')).toBeNull();
  });

  it('tells circuit and place in the title of the window', async () => {
    const { fixture, title } = await open('overview', localView(CACHED, []));
    expect(title()).toBe('A12 · Dairy · Firstcold');
    fixture.componentRef.setInput('at', 'submit');
    await fixture.whenStable();
    expect(title()).toBe('A12 · Look it over and submit · Firstcold');
  });
});
