/** A picture's size as its file says it, in pixels. */
export interface ImageDimensions {
  readonly width: number;
  readonly height: number;
}

/** JPEG's frame headers: SOF0 to SOF15 without the three markers between them that mean something else. */
const NO_FRAME: ReadonlySet<number> = new Set([0xc4, 0xc8, 0xcc]);
const isFrame = (marker: number): boolean => marker >= 0xc0 && marker <= 0xcf && !NO_FRAME.has(marker);

/**
 * Reads a JPEG's or PNG's size without decoding it, because decoding a huge one ends the page on many phones.
 *
 * @returns `null` for another format, or a file that doesn't say
 */
export function imageDimensions(file: ArrayBuffer): ImageDimensions | null {
  const view = new DataView(file);
  if (view.byteLength < 24) return null;
  if (view.getUint32(0) === 0x89504e47) return { width: view.getUint32(16), height: view.getUint32(20) };
  return view.getUint16(0) === 0xffd8 ? jpegDimensions(view) : null;
}

function jpegDimensions(view: DataView): ImageDimensions | null {
  let at = 2;
  while (at + 9 <= view.byteLength && view.getUint8(at) === 0xff) {
    const marker = view.getUint8(at + 1);
    if (isFrame(marker)) return { height: view.getUint16(at + 5), width: view.getUint16(at + 7) };
    // A fill byte before a marker, or a segment to step over: its length counts its own two bytes.
    at += marker === 0xff ? 1 : 2 + view.getUint16(at + 2);
  }
  return null;
}
