import session from '../en/session.json';
import shell from '../en/shell.json';

/** The words that the sign-in page and the shell around it need: all that loads before anybody is here. */
export const WORDS = { session, shell };
