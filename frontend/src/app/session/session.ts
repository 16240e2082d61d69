import { computed, inject, Injectable, signal } from '@angular/core';
import { may, type Action } from '#shared/access/may';
import type { Me } from '#shared/contracts/session';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import { PhoneDevice } from './phone-device';
import { httpFailure } from './problem-code';
import { Remembered } from './remembered';
import { SessionApi } from './session-api';

/**
 * `remembered`: somebody was here and the server hasn't answered yet. `phoneOnly`: the session is over, but this phone
 * may still deliver and read that person's own work. `signedOut`: nobody is here.
 */
export type Standing = 'asking' | 'remembered' | 'signedIn' | 'phoneOnly' | 'signedOut';

/** Who is here. Starts from what the browser remembers, so that nothing waits for a network that may not be there. */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(SessionApi);
  private readonly remembered = inject(Remembered);
  private readonly phone = inject(PhoneDevice);
  private readonly person = signal<Me | null>(null);
  private readonly current = signal<Standing>('asking');
  private asked: Promise<void> = Promise.resolve();

  readonly me = this.person.asReadonly();
  readonly standing = this.current.asReadonly();
  readonly isSignedIn = computed(() => this.current() === 'signedIn' || this.current() === 'remembered');

  /** Restores whoever was here and asks the server in the background. */
  begin(): void {
    const me = this.remembered.me();
    this.person.set(me);
    if (me) {
      this.phone.restore(me.id);
      this.current.set('remembered');
    }
    this.asked = this.verify();
  }

  /** Resolves once it is known whether somebody is here: at once for a remembered person. */
  async settled(): Promise<Standing> {
    if (this.current() === 'asking') await this.asked;
    return this.current();
  }

  /** Asks the server who is signed in. Without a network everything stays as it is. */
  async verify(): Promise<void> {
    try {
      const me = await this.api.read();
      if (me) await this.welcome(me);
      else this.sessionOver();
    } catch (error) {
      const failure = httpFailure(error);
      if (!failure) throw error;
      if (this.current() === 'asking') this.current.set('signedOut');
    }
  }

  /** @throws {HttpErrorResponse} with code `wrongCredentials` or `tooManyTries`, or without a network */
  async signIn(email: string, password: string): Promise<Me> {
    const me = await this.api.signIn(email, password);
    await this.welcome(me);
    return me;
  }

  /** Ends the session. The phone forgets who was here; what still waits to be sent stays. */
  async signOut(): Promise<void> {
    try {
      await this.api.signOut();
    } catch (error) {
      // There was no session left to end, which is what was wanted.
      if (httpFailure(error)?.status !== 401) throw error;
    }
    this.forget();
  }

  /** The server says that nobody is signed in: a phone with a device of its own keeps its person's work. */
  sessionOver(): void {
    if (this.person() && this.phone.deviceId()) this.current.set('phoneOnly');
    else this.forget();
  }

  /** Whether whoever is here may do something: the same table that the server refuses by. */
  may(action: Action, openingId?: OpeningId, companyId?: CompanyId): boolean {
    const me = this.person();
    if (!me) return false;
    const subject = { companyId: companyId ?? me.companyId, ...(openingId ? { openingId } : {}) };
    return may({ ...me }, action, subject);
  }

  private async welcome(me: Me): Promise<void> {
    this.person.set(me);
    this.remembered.keepMe(me);
    this.current.set('signedIn');
    if (recordsOnSite(me)) await this.phone.register(me.id);
  }

  private forget(): void {
    this.person.set(null);
    this.remembered.keepMe(null);
    this.phone.restore(null);
    this.current.set('signedOut');
  }
}

/** Whether the person records on sites, and so needs a device of their own in this browser. */
function recordsOnSite(me: Me): boolean {
  return me.companyRole !== 'contractor' || me.memberships.some(({ role }) => role !== 'contractor');
}
