import { describe, expect, it } from '@jest/globals';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import type { Language } from '#shared/checklist/text';
import { FAILURE_CODES } from '#shared/failures/failure';
import { WORDS as EN } from '../../../i18n/loader/en';
import { WORDS as ES } from '../../../i18n/loader/es';
import { withWords } from '../words/with-words.fixture';
import { ProblemNote } from './problem-note';

async function render(problem: unknown, language: Language = 'en'): Promise<ComponentFixture<ProblemNote>> {
  TestBed.configureTestingModule({ imports: [ProblemNote, withWords(language)] });
  const fixture = TestBed.createComponent(ProblemNote);
  fixture.componentRef.setInput('problem', problem);
  await fixture.whenStable();
  return fixture;
}

describe('ProblemNote', () => {
  it('offers another try when nobody answered', async () => {
    const fixture = await render({ status: 0, error: null });
    let tries = 0;
    fixture.componentInstance.retry.subscribe(() => (tries += 1));
    const root = fixture.nativeElement as HTMLElement;
    expect(root.textContent).toContain('No answer from the server');
    root.querySelector('button')?.click();
    expect(tries).toBe(1);
  });

  it('offers no other try where a person has to change something', async () => {
    const error = {
      type: 'about:blank',
      title: '',
      status: 400,
      detail: '',
      code: 'invalidInput',
      places: [{ path: 'body.personId', message: 'This person has no such role here.' }],
      facts: {},
      requestId: 'r-2',
    };
    const root = (await render({ status: 400, error }, 'es')).nativeElement as HTMLElement;
    expect(root.querySelector('button')).toBeNull();
    expect(root.querySelector('li')?.textContent).toBe(
      'Persona: los circuitos se asignan a instaladores y responsables de esta apertura.',
    );
  });

  it.each([...FAILURE_CODES, 'temporary', 'bug', 'offline', 'unknown'])(
    'has words for %s in both languages',
    (code) => {
      const key = `failure_${code}`;
      expect(EN.ui).toHaveProperty(key);
      expect(ES.ui).toHaveProperty(key);
    },
  );
});
