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

/**
 * Decodes a JPEG fully and makes its two smaller renditions. Runs in a worker thread: jimp takes a second for what a
 * request handler must not wait for.
 *
 * @throws when the picture is broken
 */
export default async function renderPhoto(bytes: Uint8Array): Promise<PhotoRenditions> {
  const image = await Jimp.fromBuffer(Buffer.from(bytes));
  if (Math.max(image.width, image.height) > PRINT_SIDE) image.scaleToFit({ w: PRINT_SIDE, h: PRINT_SIDE });
  const print = await image.getBuffer(JimpMime.jpeg, { quality: PRINT_QUALITY });
  image.scaleToFit({ w: THUMBNAIL_SIDE, h: THUMBNAIL_SIDE });
  const thumbnail = await image.getBuffer(JimpMime.jpeg, { quality: THUMBNAIL_QUALITY });
  return { thumbnail, print };
}
