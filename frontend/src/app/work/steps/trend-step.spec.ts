import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { of, type Observable } from 'rxjs';
import type { TrendAnswer } from '#shared/checklist/kinds/trend';
import { readLogger } from '#shared/refrigeration/logger/read-logger';
import { PULL_DOWN, TREND_STEP, trendAnswer } from '../../ui/trend-chart/trend.fixture';
import { withWords } from '../../ui/words/with-words.fixture';
import { NOW_MS } from '../coil-walk/phone-clock';
import type { LogReading, LogStage } from '../logger/log-reading';
import { LoggerReader } from '../logger/logger-reader';
import { SEQUENCE } from '../sequence/sequence.fixture';
import { StepDraft, type OpenStep } from './step-draft';
import { TrendStep } from './trend-step';

const FACTS = { refrigerant: 'R-448A', atmospherePaAbs: 101_325, elevationM: 0, unitSystem: 'us' } as const;

const HELD = [
  'Time (h),Air (°F)',
  ...Array.from({ length: 181 }, (_, index) => `${index / 6},${index < 30 ? 70 - index : 38}`),
];

function readingOf(text: string): LogReading {
  const log = readLogger(text);
  return log.ok ? { ok: true, file: { name: 'box.csv', sha256: 'b'.repeat(64), rows: log.rows }, log } : log;
}

async function open(previous: TrendAnswer | null, reading: LogReading) {
  const read = (): Observable<LogStage> => of({ kind: 'done', reading });
  TestBed.configureTestingModule({
    imports: [TrendStep, withWords()],
    providers: [
      StepDraft,
      { provide: LoggerReader, useValue: { read } },
      { provide: NOW_MS, useValue: () => Date.parse('2027-06-01T12:00:00') },
    ],
  });
  const draft = TestBed.inject(StepDraft);
  draft.open({
    sequenceId: SEQUENCE,
    step: TREND_STEP,
    facts: FACTS,
    previous,
    isStanding: false,
    record: () => undefined,
    personName: 'Installer',
    arrivedPhotos: new Set(),
    photosElsewhere: new Map(),
  } as unknown as OpenStep);
  const fixture = TestBed.createComponent(TrendStep);
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const choose = async (): Promise<void> => {
    const box = root.querySelector('input')!;
    Object.defineProperty(box, 'files', { value: [new File([''], 'box.csv')], configurable: true });
    box.dispatchEvent(new Event('change'));
    await fixture.whenStable();
  };
  return { draft, root, choose, text: () => root.textContent.replace(/\s+/g, ' ') };
}

beforeEach(() => localStorage.clear());

describe('TrendStep', () => {
  it('says what is wanted and that the log is missing', async () => {
    const { draft, text } = await open(null, readingOf(''));
    expect(text()).toContain('Wanted: 41.0 °F or less.');
    expect(text()).toContain('To hold for 24.0 h');
    expect(text()).toContain('Above it for up to 30 min is allowed');
    expect(draft.answer()).toBeNull();
    expect(draft.lacking()).toBe('log');
  });

  it('takes no log that ends in the future', async () => {
    const rows = (from: string, to: string): string => `Time,Air (°F)\n${from},38\n${to},38`;
    const future = await open(null, readingOf(rows('2027-06-02 08:00', '2027-06-02 08:10')));
    await future.choose();
    expect([future.draft.answer(), future.draft.lacking()]).toEqual([null, 'logInFuture']);
    TestBed.resetTestingModule();
    const today = await open(null, readingOf(rows('2027-06-01 08:00', '2027-06-01 08:10')));
    await today.choose();
    expect(today.draft.answer()).not.toBeNull();
  });

  it('judges a file as soon as it is chosen', async () => {
    const { draft, choose, root, text } = await open(null, readingOf(HELD.join('\n')));
    await choose();
    const answer = draft.answer() as TrendAnswer;
    expect(answer).toMatchObject({ kind: 'trend', column: 'Air (°F)', startText: '0' });
    expect(answer.atS).toHaveLength(181);
    expect(answer.temperatureK[0]).toBeCloseTo(294.26, 9);
    expect(draft.judgement()).toMatchObject({ outcome: 'within', verdicts: ['trend_held'] });
    expect(text()).toContain('Reached the band and held it.');
    expect(text()).toContain('181 of 181 rows read');
    expect(root.querySelector('app-working-slip details')).not.toBeNull();
  });

  it('says that it has not held long enough, which may be recorded and does not count', async () => {
    const { draft, choose, text } = await open(null, readingOf(HELD.slice(0, 100).join('\n')));
    await choose();
    expect(draft.judgement()).toMatchObject({ verdicts: ['trend_notLongEnough'], counts: false });
    expect(text()).toContain('In the band, but not yet for the time asked.');
    expect(draft.refusals()).toEqual([]);
  });

  it('keeps what a file gave when the page closes', async () => {
    const first = await open(null, readingOf(HELD.join('\n')));
    await first.choose();
    const answer = first.draft.answer();
    TestBed.resetTestingModule();
    const second = await open(null, readingOf(''));
    expect(second.draft.answer()).toEqual(answer);
    expect(second.text()).toContain('box.csv');
    expect(second.text()).toContain('Reached the band and held it.');
  });

  it('shows what was recorded, and keeps it when another file is refused', async () => {
    const { draft, choose, text } = await open(PULL_DOWN, { ok: false, reason: 'notText' });
    expect(text()).toContain('box 7.csv');
    expect(draft.answer()).toEqual(PULL_DOWN);
    await choose();
    expect(text()).toContain('box.csv is not text.');
    expect(text()).toContain('What was taken before stays as it is.');
    expect(draft.answer()).toEqual(PULL_DOWN);
  });

  it('takes the former answer back while another file’s column is not chosen', async () => {
    const { draft, choose } = await open(
      trendAnswer(30, () => 275),
      readingOf('Time (h),A,B\n0,1,2\n1,2,3'),
    );
    await choose();
    expect(draft.answer()).toBeNull();
    expect(draft.lacking()).toBe('log');
  });
});
