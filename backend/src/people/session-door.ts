import type { Request, RequestHandler, Response } from 'express';
import passport from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Me } from '#shared/contracts/session';
import { DomainFailure } from '#shared/failures/failure';
import type { DeviceId, PersonId } from '#shared/plant/ids';
import { readCookie, setPrivateCookie } from '../http/csrf';
import { SESSION_COOKIE } from '../http/session';
import { DEVICE_COOKIE, type PeopleAccessDesk } from './access-desk';
import type { KnownPerson } from './people.repository';
import { DEVICE_MS, toMe, type SessionService } from './session.service';

/** Where a browser's session begins and ends: the part of signing in that has to do with cookies. */
export class SessionDoor {
  private readonly authenticate: RequestHandler;

  constructor(
    private readonly service: SessionService,
    private readonly desk: PeopleAccessDesk,
    private readonly session: RequestHandler,
    private readonly secure: boolean,
  ) {
    const authenticator = new passport.Passport();
    authenticator.use(
      new LocalStrategy(
        { usernameField: 'email', passwordField: 'password', passReqToCallback: true },
        (request, email, password, done) => {
          service.signIn(email, password, request.ip ?? '').then((person) => done(null, person), done);
        },
      ),
    );
    // The session is ours to write (a new id, when the password was given), so passport only checks the credentials.
    this.authenticate = authenticator.authenticate('local', { session: false }) as RequestHandler;
  }

  async signIn(request: Request, response: Response): Promise<Me> {
    await run(this.session, request, response);
    await run(this.authenticate, request, response);
    const person = request.user as KnownPerson | undefined;
    if (!person) throw new DomainFailure('wrongCredentials', 'The address or the password is not right.');
    // A new id at sign-in: one that was planted before is worth nothing after.
    await new Promise<void>((resolve, reject) =>
      request.session.regenerate((error) => (error ? reject(error) : resolve())),
    );
    request.session.personId = person.id;
    request.session.passwordGivenAt = Date.now();
    await save(request);
    // Another person's device credential must not go on speaking for this browser.
    const device = await this.desk.byDevice(request);
    if (device && device.person.id !== person.id) this.dropDevice(response);
    return toMe(person);
  }

  /** The person of this browser's session, or `null`. */
  async whoIsHere(request: Request, response: Response): Promise<Me | null> {
    const caller = await this.desk.bySession(request, response);
    return caller && this.service.me(caller.person.id);
  }

  /** Signs out, also where the session has ended by itself: the cookies go, and the device's credential ends. */
  async signOut(request: Request, response: Response): Promise<void> {
    const device = await this.desk.byDevice(request);
    if (device?.deviceId) await this.service.endCredential(device.deviceId);
    await run(this.session, request, response);
    await new Promise<void>((resolve, reject) =>
      request.session.destroy((error) => (error ? reject(error) : resolve())),
    );
    response.clearCookie(SESSION_COOKIE, { path: '/' });
    this.dropDevice(response);
  }

  async passwordAgain(request: Request, personId: PersonId, email: string, password: string): Promise<void> {
    await this.service.checkPasswordAgain(personId, email, password, request.ip ?? '');
    request.session.passwordGivenAt = Date.now();
    await save(request);
  }

  async registerDevice(
    request: Request,
    response: Response,
    person: { id: PersonId; companyId: string },
    known: DeviceId | null,
    label: string,
  ) {
    const fromCookie = (readCookie(request, DEVICE_COOKIE) ?? '').split('.')[0];
    const earlier = known ?? (fromCookie ? (fromCookie as DeviceId) : null);
    // A credential that is still good stays: a lost answer, or a second tab, would leave the phone with a dead one.
    const current = await this.desk.byDevice(request);
    const cookie = readCookie(request, DEVICE_COOKIE);
    if (cookie && current?.deviceId && current.person.id === person.id && current.deviceId === earlier) {
      this.keepDevice(response, cookie);
      return this.service.extendDevice(current.deviceId);
    }
    const registered = await this.service.registerDevice(person, isUuid(earlier) ? earlier : null, label);
    this.keepDevice(response, registered.credential);
    return registered.response;
  }

  private keepDevice(response: Response, credential: string): void {
    setPrivateCookie(response, DEVICE_COOKIE, credential, {
      secure: this.secure,
      maxAgeMs: DEVICE_MS,
      path: '/api',
    });
  }

  private dropDevice(response: Response): void {
    response.clearCookie(DEVICE_COOKIE, { path: '/api' });
  }
}

function isUuid(text: string | null): boolean {
  return text !== null && /^[0-9a-f-]{36}$/i.test(text);
}

function save(request: Request): Promise<void> {
  return new Promise((resolve, reject) =>
    request.session.save((error) => (error ? reject(error) : resolve())),
  );
}

function run(handler: RequestHandler, request: Request, response: Response): Promise<void> {
  return new Promise((resolve, reject) => {
    handler(request, response, (error?: unknown) => (error ? reject(error) : resolve()));
  });
}
