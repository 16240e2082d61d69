import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import type { Language } from '#shared/checklist/text';
import type { TrendAnswer, TrendStep } from '#shared/checklist/kinds/trend';
import type { UnitSystem } from '#shared/units/unit-system';
import { withWords } from '../words/with-words.fixture';
import { TrendChart } from './trend-chart';
import { PULL_DOWN, TREND_STEP, trendAnswer } from './trend.fixture';

async function render(
  answer: TrendAnswer,
  more: { step?: TrendStep; unitSystem?: UnitSystem; language?: Language } = {},
): Promise<HTMLElement> {
  const { step = TREND_STEP, unitSystem = 'us', language = 'en' } = more;
  TestBed.configureTestingModule({ imports: [TrendChart, withWords(language)] });
  const fixture = TestBed.createComponent(TrendChart);
  for (const [name, value] of Object.entries({ step, answer, unitSystem, label: step.title[language] })) {
    fixture.componentRef.setInput(name, value);
  }
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}
const said = (root: HTMLElement): string =>
  [...root.querySelectorAll('figcaption p')]
    .map((one) => one.textContent.replace(/\s+/g, ' ').trim())
    .join(' ');

describe('TrendChart', () => {
  it('says in sentences what it draws', async () => {
    const root = await render(PULL_DOWN);
    // 298.15 K is 77 °F, 273.15 K is 32 °F; 278.15 K is passed after four hours, and 281.15 K lies 3/8 of the way above
    // it on either side of ten hours: 2 · 600 s · 3/8 above for 450 s.
    expect(said(root)).toBe(
      'Pull-down of the box: Over 36.0 h, from 32.0 °F to 77.0 °F. Wanted: 41.0 °F or less. ' +
        'Reached the band after 4.0 h. Longest above afterwards: 8 min, from 9.9 h on.',
    );
    expect(root.querySelector('.chart')?.getAttribute('aria-hidden')).toBe('true');
  });

  it('says it in Spanish and in °C', async () => {
    const text = said(await render(PULL_DOWN, { language: 'es', unitSystem: 'si' }));
    expect(text).toContain('Abatimiento de la cámara: En 36.0 h, de 0.0 °C a 25.0 °C. Se pide');
    expect(text).toContain('Alcanzó la banda después de 4.0 h');
  });

  it('marks when the band was reached and the longest time above it', async () => {
    const root = await render(PULL_DOWN);
    expect(Number.parseFloat(root.querySelector('.reached')?.getAttribute('x1') ?? '')).toBeCloseTo(
      (4 / 36) * 100,
      2,
    );
    const above = root.querySelector('.above');
    expect(Number.parseFloat(above?.getAttribute('width') ?? '')).toBeCloseTo((450 / 129_600) * 100, 2);
  });

  it('has no marks where the band was never reached', async () => {
    const root = await render(trendAnswer(12, () => 290));
    expect(said(root)).toContain('Never in the band');
    expect(root.querySelector('.reached, .above')).toBeNull();
  });

  it('says that it stayed in the band, and both its edges', async () => {
    const step = { ...TREND_STEP, bandLowK: 272.15 };
    const root = await render(
      trendAnswer(12, () => 275.15),
      { step, unitSystem: 'si' },
    );
    expect(said(root)).toContain('Wanted: −1.0 °C to 5.0 °C.');
    expect(said(root)).toContain('Not above it afterwards');
    expect(root.querySelectorAll('.edge')).toHaveLength(2);
  });

  it('says how long nothing was logged', async () => {
    const whole = trendAnswer(12, () => 275.15);
    const cut = (values: readonly number[]) => values.filter((_, index) => index < 20 || index >= 40);
    const root = await render({ ...whole, atS: cut(whole.atS), temperatureK: cut(whole.temperatureK) });
    expect(said(root)).toContain('No samples: 3.5 h');
  });

  it('draws nothing of a log without a length', async () => {
    const root = await render(trendAnswer(0, () => 275.15));
    expect(root.querySelector('svg')).toBeNull();
  });
});
