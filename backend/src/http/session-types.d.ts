import 'express-session';

declare module 'express-session' {
  interface SessionData {
    personId: string;
    /** Milliseconds since 1970, server's clock: when the password was last given. */
    passwordGivenAt: number;
  }
}
