import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import {
  ErrorHandler,
  inject,
  Injector,
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
import { provideTransloco } from '@jsverse/transloco';
import { WordsLoader } from '../i18n/loader/words-loader';
import { APP_ROUTES } from './app.routes';
import { reachInterceptor } from './offline/reach-interceptor';
import { Session } from './session/session';
import { sessionInterceptor } from './session/session-interceptor';
import { AppErrors } from './shell/app-errors';
import { LanguageChoice } from './shell/language-choice';
import { LookChoice } from './shell/look-choice';
import { PageTitles } from './shell/page-titles';

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
    provideAppInitializer(async () => {
      const injector = inject(Injector);
      inject(LookChoice).apply();
      const language = inject(LanguageChoice);
      inject(Session).begin();
      // Words and icons come side by side; a page without either would flicker.
      const icons = import('./shell/icons').then(({ registerIcons }) => registerIcons(injector));
      await Promise.all([language.begin(), icons]);
    }),
  ],
};
