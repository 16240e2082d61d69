import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE, TEXT_WIDTH } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES } from './text-style';

export interface PhotoPlate {
  /** Size in pixels as the entry states it: the layout rests on it before any byte is read. */
  readonly width: number;
  readonly height: number;
  readonly caption: readonly string[];
  readonly alt: string;
  /** `'skip'` while measuring. */
  readonly load: () => Promise<LoadedPhoto | 'skip'>;
}

export interface LoadedPhoto {
  readonly bytes: Buffer | null;
  /** What to write into the empty frame when there are no bytes, or they turn out to be no picture. */
  readonly missing: string;
}

const GUTTER = 14;
const PLATE_WIDTH = (TEXT_WIDTH - GUTTER) / 2;
const MAX_HEIGHT = 224;
const CAPTION_GAP = 5;

/** Photos two a row, never cut; a picture that isn't there or can't be opened leaves a ruled frame that says so. */
export function photoRows(sheet: Sheet, plates: readonly PhotoPlate[]): Block[] {
  const rows: Block[] = [];
  for (let index = 0; index < plates.length; index += 2)
    rows.push(photoRow(sheet, plates.slice(index, index + 2)));
  return rows;
}

function frameOf(plate: PhotoPlate): { width: number; height: number } {
  const scale = Math.min(PLATE_WIDTH / plate.width, MAX_HEIGHT / plate.height);
  // A sliver of a panorama still leaves room for words when it is missing.
  return { width: Math.max(plate.width * scale, 60), height: Math.max(plate.height * scale, 40) };
}

function photoRow(sheet: Sheet, plates: readonly PhotoPlate[]): Block {
  const style = STYLES.small;
  const captions = plates.map((plate) =>
    plate.caption.flatMap((line) => sheet.wrap(line, style, PLATE_WIDTH)),
  );
  const picture = Math.max(...plates.map((plate) => frameOf(plate).height));
  const captionHeight = Math.max(...captions.map((lines) => lines.length)) * style.lead;
  let loaded: Awaited<ReturnType<PhotoPlate['load']>>[] = [];
  return {
    height: picture + CAPTION_GAP + captionHeight + 10,
    prepare: async () => {
      loaded = [];
      for (const plate of plates) loaded.push(await plate.load());
    },
    draw: (page, top) => {
      plates.forEach((plate, index) => {
        const x = PAGE.left + index * (PLATE_WIDTH + GUTTER);
        const frame = frameOf(plate);
        page.tagged(
          'Figure',
          () => drawPlate(page, loaded[index] ?? 'skip', { x, top, ...frame }),
          plate.alt,
        );
        page.tagged('Caption', () => {
          captions[index]?.forEach((line, row) =>
            page.text(line, x, baselineOf(top + frame.height + CAPTION_GAP + row * style.lead, style), style),
          );
        });
      });
      // Nothing keeps the bytes once they are on their way.
      loaded = [];
    },
  };
}

function drawPlate(
  sheet: Sheet,
  loaded: LoadedPhoto | 'skip',
  frame: { x: number; top: number; width: number; height: number },
): void {
  if (loaded === 'skip') return;
  const { doc } = sheet;
  const { x, top, width, height } = frame;
  const image = openPicture(sheet, loaded.bytes);
  if (image !== null)
    doc.image(image as Buffer, x, top, { fit: [width, height], align: 'center', valign: 'center' });
  doc
    .lineWidth(image === null ? 0.8 : 0.4)
    .strokeColor(COLOURS.rule)
    .rect(x, top, width, height)
    .stroke();
  if (image !== null) return;
  const style = STYLES.small;
  const lines = sheet.wrap(loaded.missing, style, width - 16);
  lines.forEach((line, row) => sheet.text(line, x + 8, baselineOf(top + 8 + row * style.lead, style), style));
}

/** The picture as pdfkit reads it, `null` when it can't: one broken photo must not end a document. */
function openPicture(sheet: Sheet, bytes: Buffer | null): unknown {
  if (bytes === null) return null;
  try {
    return (sheet.doc as unknown as { openImage(bytes: Buffer): unknown }).openImage(bytes);
  } catch {
    // pdfkit throws strings and plain errors here; all of them mean that these bytes are no JPEG or PNG.
    return null;
  }
}

/**
 * Whether pdfkit can place these bytes: a JPEG with a start, a frame and an end. It embeds the bytes unread, so what is
 * cut off would only show in the reader's viewer.
 */
export function isPlaceableJpeg(bytes: Buffer): boolean {
  if (bytes.length < 100 || bytes.readUInt16BE(0) !== 0xffd8) return false;
  // Some cameras pad the end; the end marker must still be near.
  return bytes.subarray(-64).includes(Buffer.from([0xff, 0xd9]));
}
