import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { DomainFailure } from '#shared/failures/failure';

// Angular's names: its HTTP client copies this cookie into this header on every write.
const COOKIE = 'XSRF-TOKEN';
const HEADER = 'x-xsrf-token';
const COOKIE_DAYS = 30;

/**
 * Signed double-submit token, next to SameSite=Strict cookies and a check of the Origin header. It isn't bound to the
 * session, because a phone's outbox drains with its device credential long after the session has ended.
 */
export class ForgeryGuard {
  constructor(
    private readonly secret: string,
    private readonly secure: boolean,
  ) {}

  /** Hands out a token where the browser has none that we signed. */
  readonly issue: RequestHandler = (request, response, next) => {
    if (!this.isOurs(readCookie(request, COOKIE))) {
      const nonce = randomBytes(18).toString('base64url');
      response.cookie(COOKIE, `${nonce}.${this.sign(nonce)}`, {
        sameSite: 'strict',
        secure: this.secure,
        path: '/',
        maxAge: COOKIE_DAYS * 86_400_000,
      });
    }
    next();
  };

  /**
   * Refuses a write that another site's page could have caused.
   *
   * @throws {DomainFailure} requestForged
   */
  check(request: Request): void {
    const { origin } = request.headers;
    const sameOrigin = origin === undefined || hostOf(origin) === request.headers.host;
    const cookie = readCookie(request, COOKIE);
    if (!sameOrigin || cookie === undefined || request.headers[HEADER] !== cookie || !this.isOurs(cookie)) {
      throw new DomainFailure('requestForged', 'This request did not come from a page of this application.');
    }
  }

  private isOurs(token: string | undefined): boolean {
    const [nonce, signature] = (token ?? '').split('.');
    if (!nonce || !signature) return false;
    const expected = Buffer.from(this.sign(nonce));
    const given = Buffer.from(signature);
    return expected.length === given.length && timingSafeEqual(expected, given);
  }

  private sign(nonce: string): string {
    return createHmac('sha256', this.secret).update(`xsrf ${nonce}`).digest('base64url');
  }
}

/** The value of a cookie of the request, or `undefined`. */
export function readCookie(request: Request, name: string): string | undefined {
  for (const part of (request.headers.cookie ?? '').split(';')) {
    const at = part.indexOf('=');
    if (at > 0 && part.slice(0, at).trim() === name) return decodeSafely(part.slice(at + 1).trim());
  }
  return undefined;
}

function decodeSafely(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    // URIError: somebody else's cookie with a stray percent sign.
    return text;
  }
}

function hostOf(origin: string): string | undefined {
  return URL.canParse(origin) ? new URL(origin).host : undefined;
}

/** Sets a cookie that scripts can't read and other sites can't send. */
export function setPrivateCookie(
  response: Response,
  name: string,
  value: string,
  options: { readonly secure: boolean; readonly maxAgeMs: number; readonly path: string },
): void {
  response.cookie(name, value, {
    httpOnly: true,
    sameSite: 'strict',
    secure: options.secure,
    path: options.path,
    maxAge: options.maxAgeMs,
  });
}
