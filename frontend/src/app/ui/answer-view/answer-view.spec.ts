import { describe, expect, it } from '@jest/globals';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { SequenceFacts } from '#shared/checklist/facts';
import { judge } from '#shared/checklist/judge';
import type { Answer, Step } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import { PULL_DOWN, TREND_STEP } from '../trend-chart/trend.fixture';
import { withWords } from '../words/with-words.fixture';
import { judgedFigure, otherFigures, pairLines, typedInputs } from './answer-figures';
import { AnswerView } from './answer-view';

const facts: SequenceFacts = {
  refrigerant: 'R-448A',
  atmospherePaAbs: 101_325,
  elevationM: 0,
  unitSystem: 'us',
};
const base = {
  key: 's',
  section: 'a',
  title: { en: 'Superheat of coil 1', es: 'Sobrecalentamiento del serpentín 1' },
  instruction: null,
  caution: null,
  fixtureId: null,
  coilId: null,
  required: true,
  source: 'Specification, revision 3',
};
const superheat: Step = { kind: 'superheat', ...base, band: { lowK: 10 / 3, highK: 50 / 9 } };
const pair = (pressure: string, temperature: string) => ({
  pressure: { text: pressure, unit: 'psig' as const },
  temperature: { text: temperature, unit: 'degF' as const },
});
const hunting: Answer = {
  kind: 'superheat',
  asFound: null,
  asLeft: { valve: 'hunting', low: pair('47', '14'), high: pair('48', '27') },
};

function entryOf(step: Step, answer: Answer): FoldEntry {
  const judgement = judge(step, answer, facts);
  return {
    body: { content: { kind: 'answer', stepKey: step.key, answer, workedOut: judgement } },
    server: { position: 1, standing: 'inOrder', judgement },
    hash: null,
  } as unknown as FoldEntry;
}

async function render(step: Step, entry: FoldEntry): Promise<ComponentFixture<AnswerView>> {
  TestBed.configureTestingModule({ imports: [AnswerView, withWords()] });
  const fixture = TestBed.createComponent(AnswerView);
  const photoUrl = (sha256: string, size: string): string => `/photos/${sha256}/${size}`;
  for (const [name, value] of Object.entries({ step, entry, unitSystem: 'us', photoUrl })) {
    fixture.componentRef.setInput(name, value);
  }
  await fixture.whenStable();
  return fixture;
}

describe('answer figures', () => {
  it('puts mean, bracket and limits of a hunting valve on the strip, and the rest below', () => {
    const { judgement } = entryOf(superheat, hunting).server;
    const judged = judgedFigure(judgement);
    expect(judged).toMatchObject({ dimension: 'temperatureDifference', low: 10 / 3, high: 50 / 9 });
    expect(judged?.minimum).toBeLessThan(judged?.value ?? 0);
    expect(judged?.maximum).toBeGreaterThan(judged?.value ?? 0);
    expect(otherFigures(judgement).map(({ label }) => label)).toEqual(['saturation', 'glide']);
  });

  it('lists readings as they were typed', () => {
    const { content } = entryOf(superheat, hunting).body;
    expect(typedInputs(content).map(({ label, typed }) => `${label} ${typed.text}`)).toEqual([
      'typed_pressureLeftLow 47',
      'typed_temperatureLeftLow 14',
      'typed_pressureLeftHigh 48',
      'typed_temperatureLeftHigh 27',
    ]);
  });
});

describe('pairLines', () => {
  const lines = (answer: Answer) => {
    const entry = entryOf(superheat, answer);
    return pairLines(entry.body.content, entry.server.judgement);
  };

  it('gives each pair of a hunting valve the saturation of its own pressure', () => {
    const [low, high] = lines(hunting)!;
    const { working } = entryOf(superheat, hunting).server.judgement!;
    const dewK = working.map((one) => one.lines.find(({ label }) => label === 'dewTemperature')?.value);
    expect(low).toMatchObject({ label: 'saturation_LeftLow', saturationK: dewK[0] });
    expect(high).toMatchObject({ label: 'saturation_LeftHigh', saturationK: dewK[1] });
    // 48 psig lies above 47 psig, and so does its saturation.
    expect(high!.saturationK).toBeGreaterThan(low!.saturationK!);
  });

  it('puts as found before as left, whatever the order of the working', () => {
    const found = { valve: 'steady' as const, pair: pair('40', '14') };
    const all = lines({ ...hunting, asFound: found } as Answer)!;
    expect(all.map(({ label }) => label)).toEqual([
      'saturation_Found',
      'saturation_LeftLow',
      'saturation_LeftHigh',
    ]);
    expect(all[0]!.saturationK).toBeLessThan(all[1]!.saturationK!);
  });

  it('leaves a saturation out where the as found could not be read', () => {
    const found = { valve: 'steady' as const, pair: pair('forty', '14') };
    const all = lines({ ...hunting, asFound: found } as Answer)!;
    expect(all.map(({ saturationK }) => saturationK === null)).toEqual([true, false, false]);
  });

  it('has nothing to add to a single pair', () => {
    const steady = { valve: 'steady' as const, pair: pair('47', '20') };
    expect(lines({ kind: 'superheat', asFound: null, asLeft: steady })).toBeNull();
  });
});

describe('AnswerView', () => {
  it('shows both pairs of a hunting valve with their saturations, and no other', async () => {
    const root = (await render(superheat, entryOf(superheat, hunting))).nativeElement as HTMLElement;
    const terms = [...root.querySelectorAll(':scope > dl dt')].map((term) => term.textContent);
    expect(terms).toEqual([
      'Suction pressure, as left, at the lowest',
      'Line temperature, as left, at the lowest',
      'Saturation (dew), as left, at the lowest',
      'Suction pressure, as left, at the highest',
      'Line temperature, as left, at the highest',
      'Saturation (dew), as left, at the highest',
    ]);
    const values = [...root.querySelectorAll(':scope > dl .worked-out dd')].map((one) =>
      one.textContent.trim(),
    );
    expect(new Set(values).size).toBe(2);
    expect(values.every((value) => value.endsWith('°F'))).toBe(true);
  });

  it('shows outcome, criterion, and the working behind it', async () => {
    const root = (await render(superheat, entryOf(superheat, hunting))).nativeElement as HTMLElement;
    expect(root.querySelector('app-outcome-mark')?.textContent).toMatch(/Within|Outside/);
    expect(root.querySelector('app-strip')).not.toBeNull();
    expect(root.textContent).toContain('Criterion: Specification, revision 3');
    expect(root.querySelectorAll('app-working-slip .slip')).toHaveLength(2);
    expect(root.querySelectorAll('app-working-slip p.source')).toHaveLength(1);
  });

  it('says why an answer does not count', async () => {
    const step: Step = {
      kind: 'reading',
      ...base,
      dimension: 'electricCurrent',
      limits: { low: 1, high: 2 },
      siUnit: 'A',
    };
    const entry = entryOf(step, { kind: 'reading', value: { text: 'two', unit: 'A' } });
    const text = ((await render(step, entry)).nativeElement as HTMLElement).textContent;
    expect(text).toContain('the step stays open');
    expect(text).toContain('This is not a number.');
  });

  it('asks for a photo at full size by its place', async () => {
    const step: Step = { kind: 'photo', ...base, minCount: 1 };
    const photo = { originalSha256: null, bytes: 1, width: 4, height: 3, capturedAt: null };
    const entry = entryOf(step, {
      kind: 'photo',
      photos: [
        { ...photo, sha256: 'a'.repeat(64) },
        { ...photo, sha256: 'b'.repeat(64) },
      ],
    });
    const fixture = await render(step, entry);
    const opened: number[] = [];
    fixture.componentInstance.openPhoto.subscribe((index) => opened.push(index));
    const root = fixture.nativeElement as HTMLElement;
    expect(root.querySelector('img')?.getAttribute('src')).toBe(`/photos/${'a'.repeat(64)}/thumbnail`);
    root.querySelectorAll<HTMLElement>('.photos button')[1]?.click();
    expect(opened).toEqual([1]);
  });

  it('shows a log: its file, how much of it, its line and what came of it', async () => {
    const root = (await render(TREND_STEP, entryOf(TREND_STEP, PULL_DOWN))).nativeElement as HTMLElement;
    const text = root.textContent.replace(/\s+/g, ' ');
    expect(text).toContain('box 7.csv');
    expect(text).toContain('217 of 217 rows read');
    expect(text).toContain('Column: Air (°F)');
    expect(text).toContain('Reached the band and held it.');
    expect(root.querySelector('app-trend-chart path')?.getAttribute('d')).toMatch(/^M0\.0 /);
  });

  it('gives the reason of what does not apply', async () => {
    const entry = {
      body: { content: { kind: 'notApplicable', stepKey: 's', reason: 'There are no doors.' } },
      server: { position: 1, standing: 'inOrder', judgement: null },
      hash: null,
    } as unknown as FoldEntry;
    const text = ((await render(superheat, entry)).nativeElement as HTMLElement).textContent;
    expect(text).toContain('Not applicable');
    expect(text).toContain('Reason: There are no doors.');
  });
});
