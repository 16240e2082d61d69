import type { CompanyId, OpeningId, PersonId } from '../plant/ids';

export const ROLES = ['admin', 'lead', 'installer', 'contractor'] as const;
export type Role = (typeof ROLES)[number];

/** A person's role in one opening; an admin needs none in openings of the own company. */
export interface Membership {
  readonly openingId: OpeningId;
  readonly role: Role;
}

export interface Person {
  readonly id: PersonId;
  readonly companyId: CompanyId;
  /** What the person may do for the company as a whole; says nothing about any one opening except for an admin. */
  readonly companyRole: Role;
  readonly memberships: readonly Membership[];
}
