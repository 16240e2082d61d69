import type { CompanyId, OpeningId } from '../plant/ids';
import type { Person, Role } from './roles';

/**
 * Who may do what. A screen hides exactly what this table refuses, and the server refuses exactly what it doesn't list:
 * an action that is not here can't be asked for.
 */
export const PERMISSIONS = {
  'opening.create': { scope: 'company', roles: ['admin', 'lead'] },
  'refrigerant.read': { scope: 'company', roles: ['admin', 'lead', 'installer'] },
  'refrigerant.add': { scope: 'company', roles: ['admin', 'lead'] },
  'job.read': { scope: 'company', roles: ['admin'] },
  'opening.read': { scope: 'opening', roles: ['admin', 'lead', 'installer', 'contractor'] },
  'people.read': { scope: 'opening', roles: ['admin', 'lead'] },
  'schedule.import': { scope: 'opening', roles: ['admin', 'lead'] },
  'circuit.list': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'circuit.assign': { scope: 'opening', roles: ['admin', 'lead'] },
  'sequence.read': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'entry.append': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'photo.add': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'photo.read': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'review.read': { scope: 'opening', roles: ['admin', 'lead'] },
  'review.give': { scope: 'opening', roles: ['admin', 'lead'] },
  'defrostPlan.read': { scope: 'opening', roles: ['admin', 'lead', 'installer'] },
  'defrostPlan.save': { scope: 'opening', roles: ['admin', 'lead'] },
  'package.issue': { scope: 'opening', roles: ['admin', 'lead'] },
  'package.read': { scope: 'opening', roles: ['admin', 'lead', 'contractor'] },
  'package.accept': { scope: 'opening', roles: ['contractor'] },
} as const satisfies Record<string, { scope: 'company' | 'opening'; roles: readonly Role[] }>;

export type Action = keyof typeof PERMISSIONS;

/** What an action is done to: always something of a company, nearly always of one of its openings. */
export interface AccessSubject {
  readonly companyId: CompanyId;
  readonly openingId?: OpeningId;
}

/**
 * The roles in which a person meets a subject: that of the membership in its opening, and `admin` for an admin of the
 * company that owns it. Empty for a stranger, who must not even learn that the subject exists.
 */
export function rolesFor(person: Person, subject: AccessSubject): readonly Role[] {
  const ownCompany = person.companyId === subject.companyId;
  if (subject.openingId === undefined) return ownCompany ? [person.companyRole] : [];
  const roles: Role[] = person.memberships
    .filter((membership) => membership.openingId === subject.openingId)
    .map((membership) => membership.role);
  if (ownCompany && person.companyRole === 'admin') roles.push('admin');
  return roles;
}

/** Whether the person may do the action to the subject. Pure: the server and the screens ask the same question. */
export function may(person: Person, action: Action, subject: AccessSubject): boolean {
  const permission = PERMISSIONS[action];
  if (permission.scope === 'opening' && subject.openingId === undefined) return false;
  const allowed: readonly Role[] = permission.roles;
  return rolesFor(person, subject).some((role) => allowed.includes(role));
}
