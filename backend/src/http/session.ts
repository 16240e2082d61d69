import session from 'express-session';
import expressMySqlSession from 'express-mysql-session';
import type { Pool } from 'mysql2';
import type { RequestHandler } from 'express';

export const SESSION_COOKIE = 'firstcold_session';

/** A working day and a half: a lead who signs in at six is not asked again at the end of a late evening. */
export const SESSION_MS = 18 * 3_600_000;

/** Sessions in MariaDB, so that any server can answer. `firstcold_session` is HttpOnly, SameSite=Strict, Secure behind TLS. */
export function sessionMiddleware(
  pool: Pool,
  secret: string,
  secure: boolean,
): { readonly handle: RequestHandler; readonly close: () => Promise<void> } {
  const Store = expressMySqlSession(session);
  const store = new Store(
    {
      createDatabaseTable: false,
      clearExpired: true,
      checkExpirationInterval: 900_000,
      expiration: SESSION_MS,
      endConnectionOnClose: false,
      disableTouch: true,
      schema: {
        tableName: 'session',
        columnNames: { session_id: 'session_id', expires: 'expires', data: 'data' },
      },
    },
    pool.promise(),
  );
  const handle = session({
    name: SESSION_COOKIE,
    secret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: false,
    cookie: { httpOnly: true, sameSite: 'strict', secure, maxAge: SESSION_MS, path: '/' },
  });
  return { handle, close: () => store.close() };
}
