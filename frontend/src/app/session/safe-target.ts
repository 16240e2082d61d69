/**
 * The address to go on to after signing in. It comes out of a link, so only an address of this application is taken.
 *
 * @returns `null` for none, for the sign-in page itself, and for anything that leads elsewhere
 */
export function safeTarget(target: string | undefined): string | null {
  if (!target?.startsWith('/') || target.startsWith('//') || target.includes('\\')) return null;
  return target.startsWith('/sign-in') ? null : target;
}
