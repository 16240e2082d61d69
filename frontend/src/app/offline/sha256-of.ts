import { sha256OfBytes } from '#shared/sequences/sha256';

/** SHA-256 by the browser where it offers that (a secure address), else by our own code: slower, the same. */
export async function sha256Of(bytes: ArrayBuffer): Promise<string> {
  const subtle = globalThis.crypto.subtle as SubtleCrypto | undefined;
  if (!subtle) return sha256OfBytes(new Uint8Array(bytes));
  const digest = new Uint8Array(await subtle.digest('SHA-256', bytes));
  return [...digest].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
