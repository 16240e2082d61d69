import { randomBytes } from 'node:crypto';
import { uuidv7 } from 'uuidv7';
import type * as z from 'zod/mini';
import type { deviceResponseSchema, Me } from '#shared/contracts/session';
import type { Language } from '#shared/checklist/text';
import { DomainFailure } from '#shared/failures/failure';
import type { DeviceId, PersonId } from '#shared/plant/ids';
import type { AuditService } from '../audit/audit.service';
import type { Transactions } from '../database/transactions';
import { credentialHash } from './access-desk';
import type { DevicesRepository } from './devices.repository';
import { isPassword } from './passwords';
import type { KnownPerson, PeopleRepository } from './people.repository';
import type { SignInLimit } from './sign-in-limit';

const DEVICE_MS = 30 * 86_400_000;

/** Signing in, the password given again, and the credential of a phone. */
export class SessionService {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: PeopleRepository,
    private readonly devices: DevicesRepository,
    private readonly audit: AuditService,
    private readonly limit: SignInLimit,
  ) {}

  /**
   * Checks an address and a password.
   *
   * @throws {DomainFailure} wrongCredentials for either, without saying which; tooManyTries
   */
  async signIn(email: string, password: string, address: string): Promise<KnownPerson> {
    await this.limit.begin(email, address);
    const known = await this.people.findCredentials(this.transactions.outside, email);
    const right = await isPassword(known?.passwordHash ?? null, password);
    const person =
      right && known?.isActive ? await this.people.findActive(this.transactions.outside, known.id) : null;
    if (!person) {
      throw new DomainFailure('wrongCredentials', 'The address or the password is not right.');
    }
    await this.limit.forgive(email, address);
    await this.audit.append(this.transactions.outside, {
      companyId: person.companyId,
      personId: person.id,
      action: 'session.begun',
      subject: person.id,
    });
    return person;
  }

  /** @throws {DomainFailure} wrongCredentials; tooManyTries */
  async checkPasswordAgain(
    personId: PersonId,
    email: string,
    password: string,
    address: string,
  ): Promise<void> {
    await this.limit.begin(email, address);
    const hash = await this.people.findPasswordHash(this.transactions.outside, personId);
    if (await isPassword(hash, password)) return this.limit.forgive(email, address);
    throw new DomainFailure('wrongCredentials', 'The password is not right.');
  }

  async me(personId: PersonId): Promise<Me> {
    const person = await this.people.findActive(this.transactions.outside, personId);
    if (!person) throw new DomainFailure('notSignedIn', 'Sign in first.');
    return toMe(person);
  }

  async setLanguage(personId: PersonId, language: Language): Promise<void> {
    await this.people.setLanguage(this.transactions.outside, personId, language);
  }

  /** Ends a device's credential; the device itself is taken up again at the next sign-in. */
  async endCredential(deviceId: DeviceId): Promise<void> {
    await this.devices.expire(this.transactions.outside, deviceId);
  }

  /** Gives a device another thirty days. */
  async extendDevice(deviceId: DeviceId): Promise<z.infer<typeof deviceResponseSchema>> {
    const expiresAt = new Date(Date.now() + DEVICE_MS);
    const { outside } = this.transactions;
    await this.devices.extend(outside, deviceId, expiresAt);
    const lastCount = await this.devices.findLastCount(outside, deviceId);
    return { deviceId, lastCount, expiresAt: expiresAt.toISOString() };
  }

  /** Registers this browser as a device of the person, or takes its earlier one up again with a new secret. */
  async registerDevice(
    person: { id: PersonId; companyId: string },
    known: DeviceId | null,
    label: string,
  ): Promise<{ response: z.infer<typeof deviceResponseSchema>; credential: string }> {
    const secret = randomBytes(32).toString('base64url');
    const change = {
      credentialHash: credentialHash(secret),
      expiresAt: new Date(Date.now() + DEVICE_MS),
      label,
    };
    const { outside } = this.transactions;
    const renewed = known !== null && (await this.devices.renew(outside, known, person.id, change));
    const deviceId = renewed ? known : (uuidv7() as DeviceId);
    if (!renewed) {
      await this.devices.insert(outside, {
        id: deviceId,
        companyId: person.companyId,
        personId: person.id,
        createdAt: new Date(),
        ...change,
      });
    }
    const lastCount = await this.devices.findLastCount(outside, deviceId);
    return {
      response: { deviceId, lastCount, expiresAt: change.expiresAt.toISOString() },
      credential: `${deviceId}.${secret}`,
    };
  }
}

export { DEVICE_MS };

/** What the screens learn about the person signed in. */
export function toMe(person: KnownPerson): Me {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    language: person.language,
    companyId: person.companyId,
    companyName: person.companyName,
    companyRole: person.companyRole,
    memberships: person.memberships.map((membership) => ({ ...membership })),
  };
}
