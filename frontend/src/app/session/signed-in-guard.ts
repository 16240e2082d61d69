import { inject } from '@angular/core';
import { Router, type CanActivateFn, type GuardResult } from '@angular/router';
import { Session, type Standing } from './session';

const signInUnless =
  (good: readonly Standing[]): CanActivateFn =>
  async (_route, state): Promise<GuardResult> => {
    const session = inject(Session);
    const router = inject(Router);
    if (good.includes(await session.settled())) return true;
    return router.createUrlTree(['/sign-in'], { queryParams: { then: state.url } });
  };

/** Only for people with a session; others sign in first and come back to the same address. */
export const signedInGuard: CanActivateFn = signInUnless(['signedIn', 'remembered']);

/** Also for a phone whose session is over: its own credential still reads and delivers that person's work. */
export const phoneGuard: CanActivateFn = signInUnless(['signedIn', 'remembered', 'phoneOnly']);
