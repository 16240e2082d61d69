import { HttpErrorResponse } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import type { Me } from '#shared/contracts/session';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import { Session } from './session';
import { SessionApi } from './session-api';

const OPENING = 'opening-1' as OpeningId;
const ME = {
  id: 'person-1',
  name: 'Dana Ruiz',
  email: 'dana@example.com',
  language: 'en',
  companyId: 'company-1',
  companyName: 'Northgate',
  companyRole: 'installer',
  memberships: [{ openingId: OPENING, role: 'installer' }],
} as unknown as Me;
const failing = (status: number) => new HttpErrorResponse({ status });

describe('Session', () => {
  const read = jest.fn<() => Promise<Me | null>>();
  const signOut = jest.fn<() => Promise<void>>();
  const registerDevice = jest.fn<(id: string | null) => Promise<unknown>>();

  beforeEach(() => {
    localStorage.clear();
    jest.resetAllMocks();
    registerDevice.mockResolvedValue({ deviceId: 'device-1', lastCount: 3 });
    signOut.mockResolvedValue();
    const api = { read, registerDevice, signOut };
    TestBed.configureTestingModule({ providers: [{ provide: SessionApi, useValue: api }] });
  });

  async function start(): Promise<Session> {
    const session = TestBed.inject(Session);
    session.begin();
    await session.settled();
    return session;
  }

  it('starts without a network for a person it remembers', async () => {
    localStorage.setItem('firstcold.me', JSON.stringify(ME));
    read.mockRejectedValue(failing(0));
    const session = await start();
    expect(session.standing()).toBe('remembered');
    expect(session.me()?.name).toBe('Dana Ruiz');
  });

  it('knows nobody without a network on a new phone', async () => {
    read.mockRejectedValue(failing(0));
    expect((await start()).standing()).toBe('signedOut');
  });

  it('registers the phone and takes up the same device at the next start', async () => {
    read.mockResolvedValue(ME);
    const session = await start();
    await session.verify();
    expect(registerDevice.mock.calls.map(([id]) => id)).toEqual([null, 'device-1']);
  });

  it('leaves the own work to a phone whose session is over', async () => {
    read.mockResolvedValueOnce(ME).mockResolvedValueOnce(null);
    const session = await start();
    await session.verify();
    expect(session.standing()).toBe('phoneOnly');
    expect(session.isSignedIn()).toBe(false);
    expect(session.me()?.id).toBe(ME.id);
  });

  it('forgets the person at signing out', async () => {
    read.mockResolvedValue(ME);
    const session = await start();
    await session.signOut();
    expect(session.me()).toBeNull();
    expect(localStorage.getItem('firstcold.me')).toBeNull();
  });

  it('signs out also when the session is over already', async () => {
    read.mockResolvedValueOnce(ME).mockResolvedValueOnce(null);
    signOut.mockRejectedValue(failing(401));
    const session = await start();
    await session.verify();
    await session.signOut();
    expect(session.standing()).toBe('signedOut');
  });

  it('stays signed in when signing out reaches nobody', async () => {
    read.mockResolvedValue(ME);
    signOut.mockRejectedValue(failing(0));
    const session = await start();
    await expect(session.signOut()).rejects.toMatchObject({ status: 0 });
    expect(session.me()?.id).toBe(ME.id);
  });

  it('answers by the table that the server refuses by', async () => {
    read.mockResolvedValue(ME);
    const session = await start();
    expect(session.may('entry.append', OPENING, 'another' as CompanyId)).toBe(true);
    expect(session.may('review.give', OPENING)).toBe(false);
    expect(session.may('opening.create')).toBe(false);
  });
});
