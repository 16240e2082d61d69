import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import type { Language } from '#shared/checklist/text';
import { withWords } from '../words/with-words.fixture';
import { Strip } from './strip';

async function sentenceOf(inputs: Record<string, unknown>, language: Language = 'en'): Promise<string> {
  TestBed.configureTestingModule({ imports: [Strip, withWords(language)] });
  const fixture = TestBed.createComponent(Strip);
  const all = { dimension: 'temperatureDifference', unitSystem: 'us', label: 'Superheat', ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  const text = (fixture.nativeElement as HTMLElement).querySelector('.heard-only')?.textContent ?? '';
  return text.trim().replace(/\s+/g, ' ');
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
});
