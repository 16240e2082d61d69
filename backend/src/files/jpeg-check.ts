import { DomainFailure } from '#shared/failures/failure';

/** Ten times what a phone sends after shrinking; more is a slip, or meant to keep the decoder busy. */
const MAX_PIXELS = 20_000_000;
const START_OF_SCAN = 0xda;
/** JFIF, colour profile, Adobe's colour transform: what a decoder needs. All other application data may name a place. */
const PLAIN_SEGMENTS = new Set([0xe0, 0xe2, 0xee]);
const START_OF_FRAME = new Set([
  0xc0, 0xc1, 0xc2, 0xc3, 0xc5, 0xc6, 0xc7, 0xc9, 0xca, 0xcb, 0xcd, 0xce, 0xcf,
]);

/**
 * Looks at a JPEG's markers (ITU-T T.81) without decoding it: cheap enough to do while the phone waits.
 *
 * @returns its size in pixels
 * @throws {DomainFailure} notAnImage: other content, no frame, cut off, with metadata that should have been taken out;
 *   tooLarge: 20 megapixels or more
 */
export function checkJpeg(bytes: Buffer): { width: number; height: number } {
  if (bytes.length < 4 || bytes.readUInt16BE(0) !== 0xffd8) {
    throw new DomainFailure('notAnImage', 'This is not a JPEG picture.');
  }
  const end = bytes.lastIndexOf(Buffer.from([0xff, 0xd9]));
  if (end < 0 || end < bytes.length - 64) {
    throw new DomainFailure('notAnImage', 'The picture is cut off: its end is missing.');
  }
  const size = findFrame(bytes);
  if (!size) throw new DomainFailure('notAnImage', 'The picture has no readable frame.');
  if (size.width * size.height >= MAX_PIXELS) {
    throw new DomainFailure('tooLarge', 'The picture has 20 megapixels or more.');
  }
  return size;
}

function findFrame(bytes: Buffer): { width: number; height: number } | null {
  let at = 2;
  let size: { width: number; height: number } | null = null;
  while (at + 4 <= bytes.length) {
    if (bytes[at] !== 0xff) return null;
    const marker = bytes[at + 1] as number;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    const length = bytes.readUInt16BE(at + 2);
    if (length < 2) return null;
    if (marker === START_OF_SCAN) return size;
    if (marker >= 0xe1 && marker <= 0xef && !PLAIN_SEGMENTS.has(marker)) {
      throw new DomainFailure(
        'notAnImage',
        'The picture still holds camera metadata, which may name a place.',
      );
    }
    if (START_OF_FRAME.has(marker)) {
      if (at + 9 > bytes.length) return null;
      const [height, width] = [bytes.readUInt16BE(at + 5), bytes.readUInt16BE(at + 7)];
      if (width === 0 || height === 0) return null;
      size = { width, height };
    }
    at += 2 + length;
  }
  return null;
}
