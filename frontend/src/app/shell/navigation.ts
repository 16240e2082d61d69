import type { Me } from '#shared/contracts/session';

export interface NavigationLink {
  readonly path: string;
  /** Key of its words. */
  readonly label: string;
}

const WORK: NavigationLink = { path: '/work', label: 'shell.navWork' };
const OPENINGS: NavigationLink = { path: '/openings', label: 'shell.navOpenings' };
const REVIEW: NavigationLink = { path: '/review', label: 'shell.navReview' };

/** Where a person may go from the bar, most used first. On an ended session only the phone's own work is left. */
export function navigationFor(me: Me | null, hasSession: boolean): readonly NavigationLink[] {
  if (!me) return [];
  const roles = new Set([me.companyRole, ...me.memberships.map((membership) => membership.role)]);
  const leads = roles.has('lead') || roles.has('admin');
  const records = leads || roles.has('installer');
  if (!hasSession) return records ? [WORK] : [];
  if (leads) return [OPENINGS, REVIEW, WORK];
  return records ? [WORK, OPENINGS] : [OPENINGS];
}
