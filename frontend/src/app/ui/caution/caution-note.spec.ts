import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { CautionNote } from './caution-note';

describe('CautionNote', () => {
  it('names the hazard before the sentence', async () => {
    TestBed.configureTestingModule({ imports: [CautionNote, withWords()] });
    const fixture = TestBed.createComponent(CautionNote);
    fixture.componentRef.setInput('caution', {
      hazard: 'electricity',
      text: { en: 'Lock out the heater feed.', es: 'Bloquee la alimentación.' },
    });
    await fixture.whenStable();
    const text = (fixture.nativeElement as HTMLElement).textContent?.trim().replace(/\s+/g, ' ');
    expect(text).toBe('Electricity. Lock out the heater feed.');
  });
});
