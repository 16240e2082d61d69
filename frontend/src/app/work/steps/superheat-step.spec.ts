import { signal } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { MatIconTestingModule } from '@angular/material/icon/testing';
import { beforeEach, describe, expect, it } from '@jest/globals';
import type { SuperheatAnswer } from '#shared/checklist/kinds/superheat';
import type { StepView } from '#shared/sequences/sequence-view';
import { PhoneDevice } from '../../session/phone-device';
import { withWords } from '../../ui/words/with-words.fixture';
import { NOW_MS } from '../coil-walk/phone-clock';
import { localView } from '../sequence/local-view';
import {
  bodyOf,
  cachedOf,
  confirmStep,
  contentOf,
  PHONE,
  SEQUENCE,
  storedOf,
} from '../sequence/sequence.fixture';
import { startingAnswer } from '../sequence/step-action';
import { DraftKeeper } from './draft-keeper';
import { StepDraft } from './step-draft';
import { SuperheatStep } from './superheat-step';
import { startSuperheat, type TypedSuperheat } from './superheat-typed';

const START = Date.parse('2026-03-02T09:00:00.000Z');
const K = 1 / 1.8;
const STEPS = ['a', 'b'].map((key) =>
  confirmStep(key, { kind: 'superheat', band: { lowK: 6 * K, highK: 8 * K }, waitS: 900 } as never),
);
const pair = {
  pressure: { text: '45', unit: 'psig' as const },
  temperature: { text: '28', unit: 'degF' as const },
};
const found: SuperheatAnswer = {
  kind: 'superheat',
  asFound: { valve: 'steady', pair },
  asLeft: { valve: 'steady', pair },
  conditions: ['pastDefrost'],
};
const FORM = startSuperheat(null);
const read = (pressure: string, temperature: string) => ({ ...FORM.asLeft, pair: { pressure, temperature } });

interface Opened {
  readonly fixture: ComponentFixture<SuperheatStep>;
  readonly element: HTMLElement;
  readonly draft: StepDraft;
  readonly clock: { nowMs: number };
}

/** Opens step "a", or reopens it as a phone does that closed the page. */
async function open(
  view: StepView | null = null,
  entries: Parameters<typeof cachedOf>[1] = [],
): Promise<Opened> {
  TestBed.resetTestingModule();
  const clock = { nowMs: START };
  TestBed.configureTestingModule({
    imports: [SuperheatStep, MatIconTestingModule, withWords()],
    providers: [
      StepDraft,
      { provide: NOW_MS, useValue: () => clock.nowMs },
      { provide: PhoneDevice, useValue: { deviceId: signal(PHONE) } },
    ],
  });
  const cached = cachedOf(STEPS, entries);
  const whole = localView(cached, []);
  const shown = view ?? whole.steps[0]!;
  const draft = TestBed.inject(StepDraft);
  draft.open({
    sequenceId: SEQUENCE,
    step: shown.step,
    facts: cached.detail.stepList.facts,
    previous: startingAnswer(shown),
    isStanding: false,
    record: () => undefined,
    personName: '',
    arrivedPhotos: new Set(),
    photosElsewhere: new Map(),
    view: shown,
    whole,
  });
  const fixture = TestBed.createComponent(SuperheatStep);
  await fixture.whenStable();
  return { fixture, element: fixture.nativeElement as HTMLElement, draft, clock };
}

const keep = (typed: TypedSuperheat): void => new DraftKeeper().keep(SEQUENCE, 'a', typed);
const textOf = (element: Element | null): string => (element?.textContent ?? '').trim().replace(/\s+/g, ' ');
const radio = (element: HTMLElement, words: string): HTMLInputElement =>
  [...element.querySelectorAll('label')]
    .find((label) => textOf(label).startsWith(words))!
    .querySelector('input')!;

beforeEach(() => {
  localStorage.clear();
  // jsdom lays nothing out, so nothing scrolls there.
  Element.prototype.scrollIntoView = () => undefined;
});

describe('SuperheatStep', () => {
  it('says before recording that a reading without its conditions is preliminary', async () => {
    keep({ ...FORM, asLeft: read('45', '28') });
    const { element, draft, fixture } = await open();
    const conditions = element.querySelector('app-superheat-conditions')!;
    expect(textOf(conditions.querySelector('summary'))).toBe('Conditions: 0 of 5 met');
    expect(textOf(conditions)).toContain('Recorded as preliminary');
    for (const box of conditions.querySelectorAll<HTMLInputElement>('input')) box.click();
    await fixture.whenStable();
    expect(textOf(conditions)).not.toContain('Recorded as preliminary');
    expect(draft.judgement()?.counts).toBe(true);
  });

  it('starts from the conditions of the coil before, said on this phone a moment ago', async () => {
    const entry = storedOf(1, bodyOf(1, contentOf('b', found)));
    const { element } = await open(null, [entry]);
    expect(textOf(element.querySelector('app-superheat-conditions summary'))).toBe('Conditions: 1 of 5 met');
  });

  it('stamps a turn, waits for it by the clock and says when it is over', async () => {
    keep({ ...FORM, asFound: read('45', '34') });
    const { element, fixture, draft, clock } = await open();
    radio(element, 'Turns').click();
    await fixture.whenStable();
    element.querySelector<HTMLInputElement>('[aria-label="a quarter turn"]')!.click();
    radio(element, '↻').click();
    await fixture.whenStable();
    element.querySelector<HTMLButtonElement>('.did')!.click();
    await fixture.whenStable();
    expect(textOf(element.querySelector('[role=timer]'))).toBe('Wait 15:00');
    expect(draft.isUnsettled()).toBe(true);
    const live = element.querySelector('[aria-live=polite].heard-only')!;
    expect(textOf(live)).toBe('');

    clock.nowMs = START + 220_000;
    document.dispatchEvent(new Event('visibilitychange'));
    await fixture.whenStable();
    expect(textOf(element.querySelector('[role=timer]'))).toBe('Wait 11:20');
    clock.nowMs = START + 900_000;
    document.dispatchEvent(new Event('visibilitychange'));
    await fixture.whenStable();
    expect(textOf(element.querySelector('[role=timer]'))).toBe('Settled: read it now');
    expect(textOf(live)).toBe('Settled: read it now');
    expect(draft.isUnsettled()).toBe(false);
  });

  it('comes back to the wait and to the as-left after the page was closed', async () => {
    const turn = { turns: 0.25, direction: 'clockwise' as const, beforeK: null, readBefore: null };
    keep({
      ...FORM,
      asFound: read('45', '34'),
      turns: [{ ...turn, at: new Date(START - 300_000).toISOString() }],
    });
    const { element } = await open();
    expect(textOf(element.querySelector('[role=timer]'))).toBe('Wait 10:00');
    expect(radio(element, 'As left').checked).toBe(true);
  });

  it('offers to leave as found only while the valve was not turned', async () => {
    keep({ ...FORM, asFound: read('45', '34') });
    const untouched = await open();
    radio(untouched.element, 'As found').click();
    await untouched.fixture.whenStable();
    expect(untouched.element.textContent).toContain('Not adjusted: left as found');
    const turn = { turns: 0.25, direction: 'clockwise' as const, beforeK: null, readBefore: null };
    keep({ ...FORM, asFound: read('45', '34'), turns: [{ ...turn, at: new Date(START).toISOString() }] });
    const turned = await open();
    radio(turned.element, 'As found').click();
    await turned.fixture.whenStable();
    expect(turned.element.textContent).not.toContain('Not adjusted: left as found');
  });

  it('shows both averages of a series and marks the one that is judged', async () => {
    const rows = ['26', '30', '30', '30'].map((temperature, index) => ({
      since: `${index}:00`,
      pressure: '45',
      temperature,
    }));
    keep({ ...FORM, asLeft: { ...FORM.asLeft, valve: 'series', readings: rows } });
    const { element } = await open();
    const lines = [...element.querySelectorAll('app-superheat-means dl > div')].map(textOf);
    expect(lines[0]).toMatch(/^Time-weighted mean \d/);
    expect(lines[1]).toMatch(/^Middle of high and low judged by this \d/);
  });

  it('explains at a height what the gauge shows otherwise, once there is a pressure', async () => {
    keep({ ...FORM, asLeft: read('45', '28') });
    const { element } = await open();
    const told = textOf(element.querySelector('app-gauge-explained'));
    expect(told).toContain('Gauge and page rest on the same pressure here.');
    expect(told).toContain('Superheat is counted from dew');
  });
});

describe('a stale superheat', () => {
  const first = storedOf(1, bodyOf(1, contentOf('a', found)));
  const turns = [{ turns: 0.25, direction: 'clockwise' as const, at: '2026-03-02T09:20:00.000Z' }];
  const later = storedOf(
    2,
    bodyOf(2, contentOf('b', { ...found, turns }), { deviceTime: '2026-03-02T09:40:00.000Z' }),
  );

  it('shows what it read before and has empty boxes for the new as-left', async () => {
    const { element, draft } = await open(null, [first, later]);
    expect(draft.current.view.again).toBe('stale');
    expect(textOf(element.querySelector('app-superheat-read-before'))).toContain('(45 psig · 28 °F)');
    expect(radio(element, 'As left').checked).toBe(true);
    const boxes = element.querySelectorAll<HTMLInputElement>('app-pair-boxes input');
    expect([...boxes].map(({ value }) => value)).toEqual(['', '']);
  });

  it('takes a new as-left alone, without asking for an as-found that was read long ago', async () => {
    keep({ ...FORM, asLeft: read('45', '28') });
    const { element, draft } = await open(null, [first, later]);
    expect(element.textContent).not.toContain('No as-found reading');
    expect(draft.answer()).toMatchObject({ asFound: null, asLeft: { valve: 'steady' } });
  });
});
