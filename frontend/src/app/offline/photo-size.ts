/** Longest side of a photo as it is sent, in pixels. */
export const LONGEST_SIDE_PX = 2048;
/** More than this is refused: decoding it would end the page on most phones. */
export const MOST_PIXELS = 100_000_000;
/** Up to this, a picture that can't be opened is broken; above, it may as well be too large for the phone. */
export const SURELY_OPENED_PIXELS = 40_000_000;

/** Why a file can't become a photo: keys of the words. */
export type PhotoRefusal = 'notAnImage' | 'tooManyPixels' | 'couldNotShrink';

/**
 * The size that a photo is shrunk to, in proportion; a smaller one stays as it is.
 *
 * @returns whole pixels, at least 1
 */
export function shrunkSize(width: number, height: number): { width: number; height: number } {
  const scale = Math.min(1, LONGEST_SIDE_PX / Math.max(width, height));
  return { width: Math.max(1, Math.round(width * scale)), height: Math.max(1, Math.round(height * scale)) };
}

/** Whether the first bytes are those of a picture that browsers open: JPEG, PNG, WebP, or HEIC where the browser can. */
export function looksLikeImage(head: Uint8Array): boolean {
  const text = (from: number, to: number): string => String.fromCharCode(...head.subarray(from, to));
  if (head[0] === 0xff && head[1] === 0xd8 && head[2] === 0xff) return true;
  if (head[0] === 0x89 && text(1, 4) === 'PNG') return true;
  if (text(0, 4) === 'RIFF' && text(8, 12) === 'WEBP') return true;
  return text(4, 8) === 'ftyp' && ['heic', 'heix', 'mif1', 'msf1', 'avif'].includes(text(8, 12));
}
