import { Injectable } from '@angular/core';
import type { Translation, TranslocoLoader } from '@jsverse/transloco';

/** Loads the first words of one language as a chunk of the application itself; no request goes anywhere else. */
@Injectable({ providedIn: 'root' })
export class WordsLoader implements TranslocoLoader {
  async getTranslation(language: string): Promise<Translation> {
    const { WORDS } = language === 'es' ? await import('./first-es') : await import('./first-en');
    return WORDS;
  }
}

/** All words of one language, those of the first screen included. */
export async function allWords(language: string): Promise<Translation> {
  const { WORDS } = language === 'es' ? await import('./es') : await import('./en');
  return WORDS;
}
