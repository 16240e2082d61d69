declare module 'express-mysql-session' {
  import type session from 'express-session';

  /** The library ships no types; this is the part of it in use. */
  function makeStore(
    sessionModule: typeof session,
  ): new (
    options: Record<string, unknown>,
    connection: unknown,
  ) => session.Store & { close(): Promise<void> };
  export default makeStore;
}
