import { DOCUMENT, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { TranslocoService } from '@jsverse/transloco';
import type { Language } from '#shared/checklist/text';
import { firstValueFrom } from 'rxjs';
import { allWords } from '../../i18n/loader/words-loader';
import { httpFailure } from '../session/problem-code';
import { Session } from '../session/session';
import { SessionApi } from '../session/session-api';

/** Written out here, because the contract's own list would bring its schemas into the first page. */
export const SCREEN_LANGUAGES: readonly Language[] = ['en', 'es'];

const KEY = 'firstcold.language';

/** The language of the screens: what was chosen here, else the signed-in person's, else the browser's. */
@Injectable({ providedIn: 'root' })
export class LanguageChoice {
  private readonly words = inject(TranslocoService);
  private readonly session = inject(Session);
  private readonly api = inject(SessionApi);
  private readonly document = inject(DOCUMENT);
  private readonly current = signal<Language>('en');
  private chosenHere = false;
  /** What was asked for last; `current` follows once its words are there. */
  private wanted: Language = 'en';
  private isWhole = false;

  readonly language = this.current.asReadonly();

  constructor() {
    effect(() => {
      const me = this.session.me();
      // A choice made before signing in is meant; it goes to the person instead of being overwritten by them.
      if (me && !this.chosenHere) untracked(() => void this.use(me.language));
    });
  }

  /** Loads the first language; resolves when the words of the first screen are there. */
  async begin(): Promise<void> {
    const stored = localStorage.getItem(KEY);
    const wanted = stored ?? this.document.defaultView?.navigator.language.slice(0, 2);
    await this.use(SCREEN_LANGUAGES.find((language) => language === wanted) ?? 'en');
  }

  /** Loads the words of every other screen too, now and with every language chosen later. */
  async loadAll(): Promise<void> {
    this.isWhole = true;
    await this.complete(this.wanted);
  }

  /** Switches at once, remembers it here, and with the person when somebody is signed in. */
  async choose(language: Language): Promise<void> {
    this.chosenHere = true;
    await this.use(language);
    if (!this.session.isSignedIn()) return;
    try {
      await this.api.chooseLanguage(language);
    } catch (error) {
      // The screen has switched and remembers it; without a network the person's own record waits for the next choice.
      if (!httpFailure(error)) throw error;
    }
  }

  private async use(language: Language): Promise<void> {
    this.wanted = language;
    await firstValueFrom(this.words.load(language));
    if (this.isWhole) await this.complete(language);
    // Another choice overtook this one while its words were on their way.
    if (this.wanted !== language) return;
    this.words.setActiveLang(language);
    this.current.set(language);
    this.document.documentElement.lang = language;
    localStorage.setItem(KEY, language);
  }

  private async complete(language: Language): Promise<void> {
    this.words.setTranslation(await allWords(language), language);
  }
}
