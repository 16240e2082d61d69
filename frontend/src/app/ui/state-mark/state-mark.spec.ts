import { expect, it, describe } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { StateMark } from './state-mark';

describe('StateMark', () => {
  it('says the state beside its joint, in the language that is read', async () => {
    TestBed.configureTestingModule({ imports: [StateMark, withWords('es')] });
    const fixture = TestBed.createComponent(StateMark);
    fixture.componentRef.setInput('state', 'sentBack');
    await fixture.whenStable();
    const mark = fixture.nativeElement as HTMLElement;
    expect(mark.textContent?.trim()).toBe('Devuelto');
    expect(mark.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
  });
});
