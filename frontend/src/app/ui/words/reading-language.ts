import { inject, type Signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { TranslocoService } from '@jsverse/transloco';
import { map } from 'rxjs';
import { LANGUAGES, type Language } from '#shared/checklist/text';

/** The supported language that a language tag means; English for one that we don't have. */
export function languageOf(tag: string): Language {
  return LANGUAGES.find((language) => tag.toLowerCase().startsWith(language)) ?? 'en';
}

/**
 * The language in which the screens are read now, as a signal, so that pipes and components follow a change of language
 * without being told. Call it where something can be injected.
 */
export function readingLanguage(): Signal<Language> {
  const transloco = inject(TranslocoService);
  return toSignal(transloco.langChanges$.pipe(map(languageOf)), {
    initialValue: languageOf(transloco.getActiveLang()),
  });
}
