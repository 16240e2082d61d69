/**
 * The one form of a mail address that people are known by: compatibility forms (full-width letters and the like) folded,
 * lower case. Compared byte by byte in the database, so that no other spelling finds the same person.
 */
export function plainEmail(email: string): string {
  return email.normalize('NFKC').trim().toLowerCase();
}
