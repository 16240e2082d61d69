import { provideTranslocoTranspiler, TranslocoTestingModule } from '@jsverse/transloco';
import type { Language } from '#shared/checklist/text';
import { WORDS as EN } from '../../../i18n/loader/en';
import { WORDS as ES } from '../../../i18n/loader/es';
import { PlainTranspiler } from '../../../i18n/loader/plain-transpiler';

/** The real words of both languages for a component's spec, so that a missing key shows as a failing sentence. */
export function withWords(language: Language = 'en') {
  const module = TranslocoTestingModule.forRoot({
    langs: { en: EN, es: ES },
    translocoConfig: { availableLangs: ['en', 'es'], defaultLang: language, reRenderOnLangChange: true },
    preloadLangs: true,
  });
  return { ...module, providers: [...(module.providers ?? []), provideTranslocoTranspiler(PlainTranspiler)] };
}
