import { inject } from '@angular/core';
import { Router, type RedirectFunction, type UrlTree } from '@angular/router';
import type { Me } from '#shared/contracts/session';
import { Session } from './session';

/** Where a person's day starts: installers at their circuits, everybody else at their openings. */
export function homeOf(me: Pick<Me, 'companyRole' | 'memberships'>): string {
  const roles = new Set(me.memberships.map((membership) => membership.role));
  if (me.companyRole === 'admin' || me.companyRole === 'lead' || roles.has('lead')) return '/openings';
  return me.companyRole === 'installer' || roles.has('installer') ? '/work' : '/openings';
}

/** Redirects the bare address. */
export const roleHome: RedirectFunction = async (): Promise<UrlTree> => {
  const session = inject(Session);
  const router = inject(Router);
  await session.settled();
  const me = session.me();
  return router.parseUrl(me ? homeOf(me) : '/sign-in');
};
