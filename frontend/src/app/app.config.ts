import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import {
  ErrorHandler,
  inject,
  isDevMode,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideZonelessChangeDetection,
  type ApplicationConfig,
} from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
  withRouterConfig,
} from '@angular/router';
import { provideTransloco, provideTranslocoTranspiler } from '@jsverse/transloco';
import { PlainTranspiler } from '../i18n/loader/plain-transpiler';
import { WordsLoader } from '../i18n/loader/words-loader';
import { APP_ROUTES } from './app.routes';
import { reachInterceptor } from './offline/reach-interceptor';
import { Session } from './session/session';
import { sessionInterceptor } from './session/session-interceptor';
import { AppErrors } from './shell/app-errors';
import { LanguageChoice } from './shell/language-choice';
import { LookChoice } from './shell/look-choice';
import { PageTitles } from './shell/page-titles';
import { WholeApplication } from './shell/whole-application';

/** What the whole application is made with. Nothing here waits for the network: a phone offline starts as well. */
export const APP_CONFIG: ApplicationConfig = {
  providers: [
    provideZonelessChangeDetection(),
    provideBrowserGlobalErrorListeners(),
    { provide: ErrorHandler, useExisting: AppErrors },
    provideRouter(
      APP_ROUTES,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
      withRouterConfig({ paramsInheritanceStrategy: 'always' }),
    ),
    { provide: TitleStrategy, useExisting: PageTitles },
    provideHttpClient(withFetch(), withInterceptors([reachInterceptor, sessionInterceptor])),
    provideTransloco({
      config: {
        availableLangs: ['en', 'es'],
        defaultLang: 'en',
        fallbackLang: 'en',
        reRenderOnLangChange: true,
        prodMode: !isDevMode(),
        missingHandler: { logMissingKey: true },
      },
      loader: WordsLoader,
    }),
    provideTranslocoTranspiler(PlainTranspiler),
    provideAppInitializer(async () => {
      inject(LookChoice).apply();
      const session = inject(Session);
      const whole = inject(WholeApplication);
      session.begin();
      const words = inject(LanguageChoice).begin();
      // Whoever is known here is about to open a page: what it needs comes beside the first words.
      // Should it fail, the page's guard asks again.
      if (session.me()) whole.load().catch(() => undefined);
      await words;
    }),
  ],
};
