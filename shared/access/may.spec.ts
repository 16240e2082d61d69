import { describe, expect, it } from '@jest/globals';
import type { CompanyId, OpeningId, PersonId } from '../plant/ids';
import { may, PERMISSIONS, rolesFor, type AccessSubject, type Action } from './may';
import { ROLES, type Person, type Role } from './roles';

const OURS = '00000000-0000-4000-8000-000000000001' as CompanyId;
const THEIRS = '00000000-0000-4000-8000-000000000002' as CompanyId;
const STORE = '00000000-0000-4000-8000-000000000011' as OpeningId;
const OTHER_STORE = '00000000-0000-4000-8000-000000000012' as OpeningId;

const subject: AccessSubject = { companyId: OURS, openingId: STORE };

function person(companyRole: Role, memberships: Person['memberships'], companyId = OURS): Person {
  return { id: '00000000-0000-4000-8000-000000000021' as PersonId, companyId, companyRole, memberships };
}

const member = (role: Role, companyId = OURS) => person(role, [{ openingId: STORE, role }], companyId);

/** Who may do what to one opening, written out by hand from the blueprint: a, l, i, c for the four roles. */
const TABLE: Readonly<Record<Action, string>> = {
  'opening.create': '',
  'refrigerant.read': '',
  'refrigerant.add': '',
  'job.read': '',
  'opening.read': 'alic',
  'people.read': 'al',
  'schedule.import': 'al',
  'circuit.list': 'ali',
  'circuit.assign': 'al',
  'sequence.read': 'ali',
  'entry.append': 'ali',
  'photo.add': 'ali',
  'photo.read': 'ali',
  'review.read': 'al',
  'review.give': 'al',
  'defrostPlan.read': 'ali',
  'defrostPlan.save': 'al',
  'package.issue': 'al',
  'package.read': 'alc',
  'package.accept': 'c',
};

const OPENING_ACTIONS = (Object.keys(TABLE) as Action[]).filter((action) => TABLE[action] !== '');

const cases = OPENING_ACTIONS.flatMap((action) =>
  ROLES.map((role) => ({ action, role, allowed: TABLE[action].includes(role.charAt(0)) })),
);

describe('may', () => {
  it('has a row in the table of this spec for every action, and no other', () => {
    expect(Object.keys(PERMISSIONS).sort()).toEqual(Object.keys(TABLE).sort());
  });

  it.each(cases)('answers $allowed for $action by a member with the role $role', (row) => {
    expect(may(member(row.role), row.action, subject)).toBe(row.allowed);
  });

  it.each(cases)('answers $allowed for $action by an invited $role of another company', (row) => {
    expect(may(member(row.role, THEIRS), row.action, subject)).toBe(row.allowed);
  });

  it.each(OPENING_ACTIONS)('refuses %s to everybody whose membership is in another opening', (action) => {
    const roles = ROLES.filter((role) => role !== 'admin');
    for (const role of roles) {
      expect(may(person(role, [{ openingId: OTHER_STORE, role }]), action, subject)).toBe(false);
    }
  });

  it.each(OPENING_ACTIONS)('refuses %s to an admin of another company', (action) => {
    expect(may(person('admin', [], THEIRS), action, subject)).toBe(false);
  });

  it.each(OPENING_ACTIONS)('refuses %s to a lead of the same company who is not in the opening', (action) => {
    expect(may(person('lead', []), action, subject)).toBe(false);
  });

  it.each(OPENING_ACTIONS)('refuses %s when no opening is named', (action) => {
    for (const role of ROLES) expect(may(member(role), action, { companyId: OURS })).toBe(false);
  });

  it('lets an admin work in every opening of the own company without a membership', () => {
    const admin = person('admin', []);
    const allowed = OPENING_ACTIONS.filter((action) => may(admin, action, subject));
    expect(allowed).toEqual(OPENING_ACTIONS.filter((action) => action !== 'package.accept'));
  });

  it('lets nobody of the company accept a package in the place of its contractor', () => {
    for (const role of ['admin', 'lead', 'installer'] as const) {
      expect(may(member(role), 'package.accept', subject)).toBe(false);
    }
  });

  it('keeps a contractor away from everything that is still being worked on', () => {
    const allowed = OPENING_ACTIONS.filter((action) => may(member('contractor'), action, subject));
    expect(allowed).toEqual(['opening.read', 'package.read', 'package.accept']);
  });

  it.each([
    ['opening.create', 'admin', true],
    ['opening.create', 'lead', true],
    ['opening.create', 'installer', false],
    ['opening.create', 'contractor', false],
    ['refrigerant.read', 'admin', true],
    ['refrigerant.read', 'lead', true],
    ['refrigerant.read', 'installer', true],
    ['refrigerant.read', 'contractor', false],
    ['refrigerant.add', 'admin', true],
    ['refrigerant.add', 'lead', true],
    ['refrigerant.add', 'installer', false],
    ['refrigerant.add', 'contractor', false],
    ['job.read', 'admin', true],
    ['job.read', 'lead', false],
    ['job.read', 'installer', false],
    ['job.read', 'contractor', false],
  ] as const)('takes %s by the company role %s for %s', (action, role, allowed) => {
    expect(may(person(role, []), action, { companyId: OURS })).toBe(allowed);
    expect(may(person(role, [], THEIRS), action, { companyId: OURS })).toBe(false);
  });

  it('does not let a role in an opening reach the whole company', () => {
    const invited = person('installer', [{ openingId: STORE, role: 'admin' }]);
    expect(may(invited, 'job.read', { companyId: OURS })).toBe(false);
    expect(may(invited, 'opening.create', { companyId: OURS })).toBe(false);
  });
});

describe('rolesFor', () => {
  it('knows no role of a stranger', () => {
    expect(rolesFor(person('admin', [], THEIRS), subject)).toEqual([]);
    expect(rolesFor(person('lead', []), subject)).toEqual([]);
  });

  it('puts an admin’s own role beside that of the membership', () => {
    const both = person('admin', [{ openingId: STORE, role: 'contractor' }]);
    expect([...rolesFor(both, subject)].sort()).toEqual(['admin', 'contractor']);
  });

  it('ignores the company role of somebody who is no admin', () => {
    expect(rolesFor(person('lead', [{ openingId: STORE, role: 'installer' }]), subject)).toEqual([
      'installer',
    ]);
  });
});
