import { createHash } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { deviceIdSchema, type PersonId } from '#shared/plant/ids';
import type { AccessSubject } from '#shared/access/may';
import type { Transactions } from '../database/transactions';
import { readCookie } from '../http/csrf';
import type { Caller } from '../http/define-route';
import type { AccessDesk } from '../http/mount-routes';
import type { DevicesRepository } from './devices.repository';
import type { KnownPerson, PeopleRepository } from './people.repository';
import type { SubjectsRepository } from './subjects.repository';

export const DEVICE_COOKIE = 'firstcold_device';

/** What is kept of a device credential. */
export function credentialHash(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}

/** Says who is asking, by session or by device credential, and what a path's id stands for. */
export class PeopleAccessDesk implements AccessDesk {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: PeopleRepository,
    private readonly devices: DevicesRepository,
    private readonly subjects: SubjectsRepository,
    private readonly session: RequestHandler,
  ) {}

  async bySession(request: Request, response: Response): Promise<Caller | null> {
    await this.runSession(request, response);
    const { personId, passwordGivenAt } = request.session;
    if (!personId) return null;
    const person = await this.people.findActive(this.transactions.outside, personId as PersonId);
    if (!person) return null;
    const device = await this.byDevice(request);
    return {
      ...caller(person, 'session'),
      deviceId: device?.person.id === person.id ? device.deviceId : null,
      passwordGivenAt: passwordGivenAt ? new Date(passwordGivenAt) : null,
    };
  }

  async byDevice(request: Request): Promise<Caller | null> {
    const [id, secret] = (readCookie(request, DEVICE_COOKIE) ?? '').split('.');
    const deviceId = deviceIdSchema.safeParse(id);
    if (!deviceId.success || !secret) return null;
    const person = await this.devices.findPersonByCredential(
      this.transactions.outside,
      deviceId.data,
      credentialHash(secret),
    );
    return person && { ...caller(person, 'device'), deviceId: deviceId.data };
  }

  async subject(kind: 'opening' | 'sequence' | 'package', id: string): Promise<AccessSubject | null> {
    return this.subjects.find(this.transactions.outside, kind, id);
  }

  private runSession(request: Request, response: Response): Promise<void> {
    return new Promise((resolve, reject) => {
      this.session(request, response, (error?: unknown) => (error ? reject(error) : resolve()));
    });
  }
}

function caller(person: KnownPerson, via: Caller['via']): Caller {
  return { person, personName: person.name, via, deviceId: null, passwordGivenAt: null };
}
