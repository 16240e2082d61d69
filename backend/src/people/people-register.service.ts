import { uuidv7 } from 'uuidv7';
import type { Role } from '#shared/access/roles';
import type { Language } from '#shared/checklist/text';
import { DomainFailure } from '#shared/failures/failure';
import type { CompanyId, OpeningId, PersonId } from '#shared/plant/ids';
import type { Transactions } from '../database/transactions';
import type { TemplatesService } from '../templates/templates.service';
import { plainEmail } from './plain-email';
import { hashPassword } from './passwords';
import type { KnownPerson, PeopleRepository } from './people.repository';

/** NIST SP 800-63B-4: at least 15 characters where the password is the only factor; no rules of composition. */
const SHORTEST_PASSWORD = 15;

export interface NewPerson {
  readonly companyId: CompanyId;
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly companyRole: Role;
  readonly language: Language;
}

/** Companies and people as they are entered into the books. */
export class PeopleRegister {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: PeopleRepository,
    private readonly templates: TemplatesService,
  ) {}

  async isEmpty(): Promise<boolean> {
    return !(await this.people.hasAnybody(this.transactions.outside));
  }

  /** Enters a company, with its own copy of the shipped templates. */
  async addCompany(name: string): Promise<CompanyId> {
    const id = uuidv7() as CompanyId;
    await this.transactions.run(async (context) => {
      await this.people.insertCompany(context, { id, name, createdAt: new Date() });
      await this.templates.adoptShippedLibrary(context, id);
    });
    return id;
  }

  /** @throws {DomainFailure} invalidInput for a password that is too short */
  async addPerson(person: NewPerson): Promise<PersonId> {
    const { password, email, ...facts } = person;
    if ([...password].length < SHORTEST_PASSWORD) {
      throw new DomainFailure('invalidInput', `A password has at least ${SHORTEST_PASSWORD} characters.`);
    }
    const id = uuidv7() as PersonId;
    const passwordHash = await hashPassword(password);
    await this.people.insertPerson(this.transactions.outside, {
      id,
      ...facts,
      email: plainEmail(email),
      passwordHash,
      isActive: true,
      createdAt: new Date(),
    });
    return id;
  }

  async addMember(openingId: OpeningId, companyId: CompanyId, personId: PersonId, role: Role): Promise<void> {
    await this.people.insertMembership(this.transactions.outside, {
      id: uuidv7(),
      companyId,
      openingId,
      personId,
      role,
      createdAt: new Date(),
      endedAt: null,
    });
  }

  async endMember(openingId: OpeningId, personId: PersonId): Promise<void> {
    await this.people.endMembership(this.transactions.outside, openingId, personId, new Date());
  }

  /** An active person with the roles held now. @throws {DomainFailure} notFound */
  async find(id: PersonId): Promise<KnownPerson> {
    const person = await this.people.findActive(this.transactions.outside, id);
    if (!person) throw new DomainFailure('notFound', 'There is no such person.');
    return person;
  }
}
