import { provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideTransloco, TranslocoService } from '@jsverse/transloco';
import { beforeEach, describe, expect, it } from '@jest/globals';
import type { Me } from '#shared/contracts/session';
import { WordsLoader } from '../../i18n/loader/words-loader';
import { Session } from '../session/session';
import { SessionApi } from '../session/session-api';
import { LanguageChoice } from './language-choice';
import { WholeApplication } from './whole-application';

describe('LanguageChoice', () => {
  const me = signal<Me | null>(null);
  let choice: LanguageChoice;
  const words = (key: string): string => TestBed.inject(TranslocoService).translate(key);

  beforeEach(async () => {
    localStorage.clear();
    localStorage.setItem('firstcold.language', 'en');
    me.set(null);
    TestBed.configureTestingModule({
      providers: [
        provideTransloco({
          config: {
            availableLangs: ['en', 'es'],
            defaultLang: 'en',
            missingHandler: { logMissingKey: false },
          },
          loader: WordsLoader,
        }),
        { provide: Session, useValue: { me, isSignedIn: () => false } },
        provideHttpClientTesting(),
        { provide: SessionApi, useValue: {} },
      ],
    });
    choice = TestBed.inject(LanguageChoice);
    await choice.begin();
  });

  it('begins with the words of the first screen only', () => {
    expect(words('session.signIn')).toBe('Sign in');
    expect(words('work.correct')).toBe('work.correct');
  });

  it('has the words of all screens once they are asked for, in whatever language comes next', async () => {
    await TestBed.inject(WholeApplication).load();
    expect(words('work.correct')).toBe('Correct it');
    expect(words('session.signIn')).toBe('Sign in');
    await choice.choose('es');
    expect(words('session.signIn')).toBe('Iniciar sesión');
    expect(words('work.correct')).not.toBe('work.correct');
    expect(words('work.correct')).not.toBe('Correct it');
  });

  it('takes the person’s language when somebody signs in while the rest is on its way', async () => {
    const loading = choice.loadAll();
    me.set({ language: 'es' } as Me);
    TestBed.tick();
    await loading;
    await new Promise((done) => setTimeout(done, 50));
    expect(choice.language()).toBe('es');
    expect(words('work.myCircuits')).toBe('Mis circuitos');
  });

  it('ends with what was chosen last', async () => {
    await Promise.all([choice.choose('es'), choice.choose('en')]);
    expect(choice.language()).toBe('en');
    expect(document.documentElement.lang).toBe('en');
  });
});
