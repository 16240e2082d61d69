import { describe, expect, it } from '@jest/globals';
import type { Role } from '#shared/access/roles';
import type { Me } from '#shared/contracts/session';
import { homeOf } from '../session/role-home';
import { isMissingChunk } from './app-errors';
import { navigationFor } from './navigation';

const me = (companyRole: Role, ...roles: Role[]): Me =>
  ({ companyRole, memberships: roles.map((role) => ({ openingId: 'one', role })) }) as unknown as Me;
const paths = (person: Me | null, hasSession = true) =>
  navigationFor(person, hasSession).map(({ path }) => path);

describe('navigationFor', () => {
  it.each([
    [me('lead', 'lead'), ['/openings', '/review', '/work']],
    [me('admin'), ['/openings', '/review', '/work']],
    [me('installer', 'installer'), ['/work', '/openings']],
    [me('contractor', 'contractor'), ['/openings']],
  ])('leads each role to what it may see', (person, expected) => {
    expect(paths(person)).toEqual(expected);
  });

  it('leaves only the own work when the session is over', () => {
    expect(paths(me('lead', 'lead'), false)).toEqual(['/work']);
    expect(paths(me('contractor', 'contractor'), false)).toEqual([]);
    expect(paths(null)).toEqual([]);
  });
});

describe('homeOf', () => {
  it.each([
    [me('installer', 'installer'), '/work'],
    [me('lead', 'lead'), '/openings'],
    [me('contractor', 'contractor'), '/openings'],
    [me('installer', 'lead'), '/openings'],
  ])('starts the day where the role works', (person, expected) => {
    expect(homeOf(person)).toBe(expected);
  });
});

describe('isMissingChunk', () => {
  it('tells an old page after a new version from a bug', () => {
    expect(isMissingChunk(new TypeError('Failed to fetch dynamically imported module: /x.js'))).toBe(true);
    expect(isMissingChunk(new TypeError('x is undefined'))).toBe(false);
  });
});
