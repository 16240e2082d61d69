import type * as z from 'zod/mini';
import type { openingPeopleSchema } from '#shared/contracts/openings';
import type { Role } from '#shared/access/roles';
import type { Language } from '#shared/checklist/text';
import type { DeviceId, OpeningId, PersonId } from '#shared/plant/ids';
import type { Context, Transactions } from '../database/transactions';
import type { DevicesRepository } from './devices.repository';
import type { PeopleRepository } from './people.repository';

export class PeopleService {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: PeopleRepository,
    private readonly devices: DevicesRepository,
  ) {}

  async ofOpening(openingId: OpeningId): Promise<z.infer<typeof openingPeopleSchema>> {
    const people = await this.people.findOfOpening(this.transactions.outside, openingId);
    return { people: people.map(({ id, name, role, companyName }) => ({ id, name, role, companyName })) };
  }

  /** Whether the person ever had a role in the opening. */
  async wasEverMember(context: Context, openingId: OpeningId, personId: PersonId): Promise<boolean> {
    return this.people.wasEverMember(context, openingId, personId);
  }

  async isDeviceOf(deviceId: DeviceId, personId: PersonId): Promise<boolean> {
    return this.devices.isDeviceOf(this.transactions.outside, deviceId, personId);
  }

  /** Everybody in the opening with what a mail to them needs. */
  async recipients(
    context: Context,
    openingId: OpeningId,
  ): Promise<
    { id: PersonId; name: string; email: string; language: Language; role: Role; companyName: string }[]
  > {
    return this.people.findOfOpening(context, openingId);
  }

  /** Names of people, also of those who have left. */
  async names(context: Context, ids: readonly PersonId[]): Promise<{ id: PersonId; name: string }[]> {
    return this.people.findNames(context, ids);
  }

  async companyName(companyId: string): Promise<string> {
    return this.people.findCompanyName(this.transactions.outside, companyId);
  }
}
