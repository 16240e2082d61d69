import { In } from 'typeorm';
import type { Membership, Person, Role } from '#shared/access/roles';
import type { Language } from '#shared/checklist/text';
import type { CompanyId, OpeningId, PersonId } from '#shared/plant/ids';
import { fromJson } from '../database/json-column';
import { managerOf, type Context } from '../database/transactions';
import { CompanyEntity } from './company.entity';
import { MembershipEntity } from './membership.entity';
import { PersonEntity } from './person.entity';
import { plainEmail } from './plain-email';

/** A person with what access decisions and the screens' headings need. */
export interface KnownPerson extends Person {
  readonly name: string;
  readonly email: string;
  readonly language: Language;
  readonly companyName: string;
}

export interface PersonRow {
  readonly id: string;
  readonly company_id: string;
  readonly company_role: string;
  readonly name: string;
  readonly email: string;
  readonly language: string;
  readonly company_name: string;
  readonly memberships: unknown;
}

/** The columns of a PersonRow, in one query: these run on every request. */
export const PERSON_COLUMNS = `
  p.id, p.company_id, p.company_role, p.name, p.email, p.language, c.name AS company_name,
  (SELECT JSON_ARRAYAGG(JSON_OBJECT('openingId', m.opening_id, 'role', m.role))
     FROM membership m WHERE m.person_id = p.id AND m.ended_at IS NULL) AS memberships`;

export function toKnownPerson(row: PersonRow): KnownPerson {
  return {
    id: row.id as PersonId,
    companyId: row.company_id as CompanyId,
    companyRole: row.company_role as Role,
    name: row.name,
    email: row.email,
    language: row.language as Language,
    companyName: row.company_name,
    memberships: fromJson<Membership[] | null>(row.memberships) ?? [],
  };
}

export class PeopleRepository {
  /** An active person, or `null`. */
  async findActive(context: Context, id: PersonId): Promise<KnownPerson | null> {
    const rows: PersonRow[] = await managerOf(context).query(
      `SELECT ${PERSON_COLUMNS} FROM person p JOIN company c ON c.id = p.company_id WHERE p.id = ? AND p.is_active = 1`,
      [id],
    );
    return rows[0] ? toKnownPerson(rows[0]) : null;
  }

  /** What signing in needs; also of inactive people, so that both take the same time. */
  async findCredentials(
    context: Context,
    email: string,
  ): Promise<{ id: PersonId; passwordHash: string; isActive: boolean } | null> {
    const person = await managerOf(context).findOne(PersonEntity, {
      where: { email: plainEmail(email) },
      select: { id: true, passwordHash: true, isActive: true },
    });
    return person && { ...person, id: person.id as PersonId };
  }

  async findPasswordHash(context: Context, id: PersonId): Promise<string | null> {
    const person = await managerOf(context).findOne(PersonEntity, {
      where: { id },
      select: { id: true, passwordHash: true },
    });
    return person?.passwordHash ?? null;
  }

  async setLanguage(context: Context, id: PersonId, language: Language): Promise<void> {
    await managerOf(context).update(PersonEntity, { id }, { language });
  }

  /** Everybody with a standing membership in the opening, by name. */
  async findOfOpening(
    context: Context,
    openingId: OpeningId,
  ): Promise<
    { id: PersonId; name: string; email: string; language: Language; role: Role; companyName: string }[]
  > {
    return managerOf(context).query(
      `SELECT p.id, p.name, p.email, p.language, m.role, c.name AS companyName
         FROM membership m JOIN person p ON p.id = m.person_id JOIN company c ON c.id = p.company_id
        WHERE m.opening_id = ? AND m.ended_at IS NULL AND p.is_active = 1
        ORDER BY p.name, p.id LIMIT 500`,
      [openingId],
    );
  }

  /** Whether the person ever had a role in the opening that records evidence. */
  async wasEverMember(context: Context, openingId: OpeningId, personId: PersonId): Promise<boolean> {
    return managerOf(context).exists(MembershipEntity, {
      where: { openingId, personId, role: In(['installer', 'lead', 'admin']) },
    });
  }

  async findNames(context: Context, ids: readonly PersonId[]): Promise<{ id: PersonId; name: string }[]> {
    if (ids.length === 0) return [];
    return managerOf(context).query(
      `SELECT id, name FROM person WHERE id IN (${ids.map(() => '?').join(',')})`,
      [...ids],
    );
  }

  async findCompanyName(context: Context, id: string): Promise<string> {
    const company = await managerOf(context).findOneBy(CompanyEntity, { id });
    return company?.name ?? '';
  }

  async hasAnybody(context: Context): Promise<boolean> {
    return managerOf(context).exists(PersonEntity);
  }

  async insertCompany(context: Context, company: CompanyEntity): Promise<void> {
    await managerOf(context).insert(CompanyEntity, company);
  }

  async insertPerson(context: Context, person: PersonEntity): Promise<void> {
    await managerOf(context).insert(PersonEntity, person);
  }

  async insertMembership(context: Context, membership: MembershipEntity): Promise<void> {
    await managerOf(context).insert(MembershipEntity, membership);
  }

  /** Ends a role in an opening: what the person still has on a phone will be held, not dropped. */
  async endMembership(
    context: Context,
    openingId: OpeningId,
    personId: PersonId,
    endedAt: Date,
  ): Promise<void> {
    await managerOf(context).update(MembershipEntity, { openingId, personId }, { endedAt });
  }
}
