import { HttpErrorResponse, HttpResponse, type HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { tap } from 'rxjs';
import { Connectivity } from './connectivity';

/** Tells from every call whether the server is in reach; a site's wireless network may be up and lead nowhere. */
export const reachInterceptor: HttpInterceptorFn = (request, next) => {
  const connectivity = inject(Connectivity);
  return next(request).pipe(
    tap({
      next: (event) => {
        if (event instanceof HttpResponse) connectivity.report(true);
      },
      error: (error: unknown) => {
        if (error instanceof HttpErrorResponse) connectivity.report(error.status !== 0);
      },
    }),
  );
};
