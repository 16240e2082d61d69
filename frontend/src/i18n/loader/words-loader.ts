import { Injectable } from '@angular/core';
import type { Translation, TranslocoLoader } from '@jsverse/transloco';

/** Loads the words of one language as a chunk of the application itself; no request goes anywhere else. */
@Injectable({ providedIn: 'root' })
export class WordsLoader implements TranslocoLoader {
  async getTranslation(language: string): Promise<Translation> {
    const { WORDS } = language === 'es' ? await import('./es') : await import('./en');
    return WORDS;
  }
}
