import { hash, verify } from '@node-rs/argon2';

// Argon2id with the library's defaults (19 MiB, 2 passes, 1 lane), which are OWASP's first recommendation.

/** A PHC string to keep. */
export async function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'));
}

// Compared against where there is no such person, so that an unknown address takes as long as a wrong password.
const NOBODY = hashPassword('nobody signs in with this');

/** Whether the password is the one behind the hash; always takes the time of one comparison. */
export async function isPassword(passwordHash: string | null, password: string): Promise<boolean> {
  const matches = await verify(passwordHash ?? (await NOBODY), password.normalize('NFKC'));
  return matches && passwordHash !== null;
}
