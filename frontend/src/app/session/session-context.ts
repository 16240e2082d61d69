import { HttpContext, HttpContextToken } from '@angular/common/http';

/** Whether an answer "not signed in" opens the sign-in dialog. Off for calls that a phone's own credential covers. */
export const SIGN_IN_WHEN_ASKED = new HttpContextToken(() => true);

/** The context of calls that deal with "not signed in" themselves: the outbox, reads of the stepper, signing in. */
export const quietly = (): HttpContext => new HttpContext().set(SIGN_IN_WHEN_ASKED, false);
