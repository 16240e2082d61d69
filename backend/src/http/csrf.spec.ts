import { beforeEach, describe, expect, it } from '@jest/globals';
import type { Request, Response } from 'express';
import { ForgeryGuard, readCookie } from './csrf';

interface Cookie {
  readonly name: string;
  readonly value: string;
  readonly options: Record<string, unknown>;
}

const HOST = 'cold.example:4000';

function ask(headers: Record<string, string>): Request {
  return { headers: { host: HOST, ...headers } } as unknown as Request;
}

function issueTo(guard: ForgeryGuard, headers: Record<string, string> = {}): Cookie[] {
  const cookies: Cookie[] = [];
  const response = {
    cookie: (name: string, value: string, options: Cookie['options']) =>
      cookies.push({ name, value, options }),
  } as unknown as Response;
  guard.issue(ask(headers), response, () => undefined);
  return cookies;
}

describe('ForgeryGuard', () => {
  let guard: ForgeryGuard;
  let token: string;

  beforeEach(() => {
    guard = new ForgeryGuard('a secret of the installation', true);
    token = issueTo(guard)[0]?.value ?? '';
  });

  const write = (headers: Record<string, string>) => () => guard.check(ask(headers));
  const ours = () => ({ cookie: `XSRF-TOKEN=${token}`, 'x-xsrf-token': token });
  const forged = expect.objectContaining({ code: 'requestForged' });

  it('takes a write of our own page', () => {
    expect(write({ ...ours(), origin: `https://${HOST}` })).not.toThrow();
    expect(write({ ...ours(), cookie: `theme=dark; XSRF-TOKEN=${token}; other=1` })).not.toThrow();
  });

  it.each([
    ['another site', 'https://evil.example'],
    ['the same host on another port', 'https://cold.example:4001'],
    ['a host that begins alike', `https://${HOST}.evil.example`],
    ['a page without an origin', 'null'],
    ['nonsense', 'not an address'],
  ])('refuses one whose origin is %s, even with a good token', (_name, origin) => {
    expect(write({ ...ours(), origin })).toThrow(forged);
  });

  it('refuses one without a token, without the cookie, or with two that differ', () => {
    const other = issueTo(guard)[0]?.value ?? '';
    expect(write({})).toThrow(forged);
    expect(write({ 'x-xsrf-token': token })).toThrow(forged);
    expect(write({ cookie: `XSRF-TOKEN=${token}` })).toThrow(forged);
    expect(write({ ...ours(), 'x-xsrf-token': other })).toThrow(forged);
  });

  it('refuses a token that somebody else made, though cookie and header agree', () => {
    const theirs = issueTo(new ForgeryGuard('another secret', true))[0]?.value ?? '';
    for (const made of [
      theirs,
      'made.up',
      'made',
      '.',
      '',
      `${token.split('.')[0]}.`,
      `.${token.split('.')[1]}`,
    ]) {
      expect(write({ cookie: `XSRF-TOKEN=${made}`, 'x-xsrf-token': made })).toThrow(forged);
    }
  });

  it('hands out a token that scripts may read, for this site only, behind TLS only', () => {
    expect(issueTo(guard)[0]).toMatchObject({
      name: 'XSRF-TOKEN',
      options: { sameSite: 'strict', secure: true, path: '/' },
    });
    expect(issueTo(guard)[0]?.options).not.toHaveProperty('httpOnly', true);
  });

  it('hands out another each time, and none where there is a good one already', () => {
    expect(issueTo(guard)[0]?.value).not.toBe(token);
    expect(issueTo(guard, { cookie: `XSRF-TOKEN=${token}` })).toEqual([]);
    expect(issueTo(guard, { cookie: 'XSRF-TOKEN=made.up' })).toHaveLength(1);
  });

  it('knows its tokens after a restart, and in another server of the installation', () => {
    const other = new ForgeryGuard('a secret of the installation', true);
    expect(() => other.check(ask(ours()))).not.toThrow();
  });
});

describe('readCookie', () => {
  it.each([
    ['a=1; b=2', 'b', '2'],
    ['b=1=2', 'b', '1=2'],
    ['ab=1', 'b', undefined],
    ['b=%20x', 'b', ' x'],
    ['b=100%', 'b', '100%'],
    ['b', 'b', undefined],
    ['', 'b', undefined],
    ['b=1; b=2', 'b', '1'],
  ])('finds in %j under %s %j', (cookie, name, value) => {
    expect(readCookie(ask({ cookie }), name)).toBe(value);
  });
});
