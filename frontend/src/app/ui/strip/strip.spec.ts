import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import type { Language } from '#shared/checklist/text';
import { withWords } from '../words/with-words.fixture';
import { Strip } from './strip';

async function draw(inputs: Record<string, unknown>, language: Language = 'en'): Promise<HTMLElement> {
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({ imports: [Strip, withWords(language)] });
  const fixture = TestBed.createComponent(Strip);
  const all = { dimension: 'temperatureDifference', unitSystem: 'us', label: 'Superheat', ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

const textOf = (element: HTMLElement, selector: string): string =>
  (element.querySelector(selector)?.textContent ?? '').trim().replace(/\s+/g, ' ');

async function sentenceOf(inputs: Record<string, unknown>, language: Language = 'en'): Promise<string> {
  return textOf(await draw(inputs, language), '.heard-only');
}

describe('Strip', () => {
  it('says value, limits and verdict in one sentence each', async () => {
    expect(await sentenceOf({ low: 5 / 1.8, high: 10 / 1.8, value: 8 / 1.8 })).toBe(
      'Superheat: 8.0 °F. Wanted: 5.0 °F to 10.0 °F. It lies within.',
    );
  });

  it('says which way to go, and that the valve hunts', async () => {
    expect(await sentenceOf({ low: 5, high: 10, value: 3, minimum: 1, maximum: 5, unitSystem: 'si' })).toBe(
      'Superheat: 3.0 K. Hunting between 1.0 K and 5.0 K. Wanted: 5.0 K to 10.0 K. It lies below; the way to go is up.',
    );
  });

  it('reads in Spanish with a decimal point, as in North America', async () => {
    expect(await sentenceOf({ high: 4.5, value: 3.2, unitSystem: 'si' }, 'es')).toBe(
      'Superheat: 3.2 K. Se pide: 4.5 K o menos. Está dentro.',
    );
  });

  it('shows how far it is and which way, in words beside the figure', async () => {
    const low = await draw({ low: 5 / 1.8, high: 10 / 1.8, value: 3.4 / 1.8 });
    expect(textOf(low, '.to-go')).toBe('↑ up by 1.6 °F');
    const high = await draw({ low: 5 / 1.8, high: 10 / 1.8, value: 12 / 1.8 });
    expect(textOf(high, '.to-go')).toBe('↓ down by 2.0 °F');
  });

  it('tells the way between two temperatures as a difference', async () => {
    const drawn = await draw({
      high: 273.15 + 5,
      value: 273.15 + 7,
      dimension: 'temperature',
      unitSystem: 'si',
    });
    expect(textOf(drawn, '.to-go')).toBe('↓ down by 2.0 K');
  });

  it('puts the instruments’ error beside the figure and into the sentence', async () => {
    const drawn = await draw({ low: 3 / 1.8, high: 6 / 1.8, value: 4.1 / 1.8, uncertainty: 1.6 / 1.8 });
    expect(textOf(drawn, '.figure')).toBe('4.1 ± 1.6 °F');
    expect(textOf(drawn, '.heard-only')).toContain('Instruments’ error ± 1.6 °F.');
    expect(drawn.querySelectorAll('.whisker')).toHaveLength(3);
  });
});
