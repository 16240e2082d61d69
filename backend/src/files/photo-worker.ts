import { Jimp, JimpMime } from 'jimp';

const THUMBNAIL_SIDE = 320;
const PRINT_SIDE = 1200;
const THUMBNAIL_QUALITY = 70;
const PRINT_QUALITY = 72;

export interface PhotoRenditions {
  readonly thumbnail: Uint8Array;
  /** What goes into a document: at most 1,200 px, about 90 kB. */
  readonly print: Uint8Array;
}

/** What came of a photo: its renditions, or why it can't be opened. */
export type PhotoFinding =
  | { readonly ok: true; readonly renditions: PhotoRenditions }
  | { readonly ok: false; readonly reason: string };

/**
 * Decodes a JPEG fully and makes its two smaller renditions. Runs in a worker thread: jimp takes a second for what a
 * request handler must not wait for.
 */
export default async function renderPhoto(bytes: Uint8Array): Promise<PhotoFinding> {
  const image = await decode(bytes);
  if (typeof image === 'string') return { ok: false, reason: image };
  if (Math.max(image.width, image.height) > PRINT_SIDE) image.scaleToFit({ w: PRINT_SIDE, h: PRINT_SIDE });
  const print = await image.getBuffer(JimpMime.jpeg, { quality: PRINT_QUALITY });
  image.scaleToFit({ w: THUMBNAIL_SIDE, h: THUMBNAIL_SIDE });
  const thumbnail = await image.getBuffer(JimpMime.jpeg, { quality: THUMBNAIL_QUALITY });
  return { ok: true, renditions: { thumbnail, print } };
}

async function decode(bytes: Uint8Array): Promise<Awaited<ReturnType<typeof Jimp.fromBuffer>> | string> {
  try {
    return await Jimp.fromBuffer(Buffer.from(bytes));
  } catch (error) {
    // Whatever the decoder throws for these bytes is a finding about the photo. What fails later is a fault of ours.
    return (error instanceof Error ? error.message : String(error)).slice(0, 300);
  }
}
