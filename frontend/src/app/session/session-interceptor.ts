import {
  HttpXsrfTokenExtractor,
  type HttpErrorResponse,
  type HttpHandlerFn,
  type HttpInterceptorFn,
  type HttpRequest,
} from '@angular/common/http';
import { inject, Injector } from '@angular/core';
import { catchError, from, switchMap, throwError, type Observable } from 'rxjs';
import { PasswordAgain } from './password-again';
import { problemCode } from './problem-code';
import { Session } from './session';
import { SessionApi } from './session-api';
import { SIGN_IN_WHEN_ASKED } from './session-context';

/**
 * A session that ran out is taken up again above the page, and the call is made once more: nothing that was typed is
 * lost. A forgery token that ran out is fetched anew, silently.
 */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  const injector = inject(Injector);
  return next(request).pipe(
    catchError((error: unknown) => {
      const code = problemCode(error);
      if (code === 'requestForged')
        return withFreshToken(injector, request, next, error as HttpErrorResponse);
      if (code !== 'notSignedIn' || !request.context.get(SIGN_IN_WHEN_ASKED)) return throwError(() => error);
      injector.get(Session).sessionOver();
      return from(injector.get(PasswordAgain).signInAgain()).pipe(
        switchMap((isBack) => (isBack ? next(withToken(injector, request)) : throwError(() => error))),
      );
    }),
  );
};

function withFreshToken(
  injector: Injector,
  request: HttpRequest<unknown>,
  next: HttpHandlerFn,
  error: HttpErrorResponse,
): Observable<never> | ReturnType<HttpHandlerFn> {
  // Reading the session sets the cookie; that the answer may be "not signed in" doesn't matter here.
  const read = injector.get(SessionApi).read();
  return from(read.then(ignore, ignore)).pipe(
    switchMap(() => next(withToken(injector, request))),
    catchError((again: unknown) =>
      throwError(() => (problemCode(again) === 'requestForged' ? error : again)),
    ),
  );
}

function withToken(injector: Injector, request: HttpRequest<unknown>): HttpRequest<unknown> {
  const token = injector.get(HttpXsrfTokenExtractor).getToken();
  return token && request.method !== 'GET'
    ? request.clone({ setHeaders: { 'X-XSRF-TOKEN': token } })
    : request;
}

function ignore(): void {
  // Only the cookie was wanted.
}
