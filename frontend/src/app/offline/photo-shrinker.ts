import { DOCUMENT, inject, Injectable } from '@angular/core';
import { imageDimensions } from './image-dimensions';
import {
  looksLikeImage,
  MOST_PIXELS,
  shrunkSize,
  SURELY_OPENED_PIXELS,
  type PhotoRefusal,
} from './photo-size';
import { sha256Of } from './sha256-of';

const QUALITY = 0.82;

/** A photo as it will be sent: JPEG bytes without any metadata, and where they came from. */
export interface ShrunkPhoto {
  readonly bytes: ArrayBuffer;
  readonly sha256: string;
  readonly originalSha256: string;
  readonly width: number;
  readonly height: number;
  readonly capturedAt: string | null;
}

export type ShrinkResult = { ok: true; photo: ShrunkPhoto } | { ok: false; reason: PhotoRefusal };

/**
 * Makes a camera's file small enough for a site's network: at most 2048 px a side, upright, as a new JPEG. Drawing it
 * anew leaves place, camera and owner behind; when it was taken is kept as data.
 */
@Injectable({ providedIn: 'root' })
export class PhotoShrinker {
  private readonly document = inject(DOCUMENT);

  async shrink(file: File): Promise<ShrinkResult> {
    const original = await file.arrayBuffer();
    if (!looksLikeImage(new Uint8Array(original.slice(0, 16)))) return { ok: false, reason: 'notAnImage' };
    const said = imageDimensions(original);
    const pixels = said ? said.width * said.height : 0;
    if (pixels > MOST_PIXELS) return { ok: false, reason: 'tooManyPixels' };
    let bitmap: ImageBitmap;
    try {
      bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' });
    } catch (error) {
      // InvalidStateError is the browser's "I can't decode this".
      if (!(error instanceof DOMException)) throw error;
      return { ok: false, reason: pixels > SURELY_OPENED_PIXELS ? 'tooManyPixels' : 'notAnImage' };
    }
    try {
      if (bitmap.width * bitmap.height > MOST_PIXELS) return { ok: false, reason: 'tooManyPixels' };
      return await this.redraw(bitmap, original, file.lastModified);
    } finally {
      bitmap.close();
    }
  }

  private async redraw(bitmap: ImageBitmap, original: ArrayBuffer, takenMs: number): Promise<ShrinkResult> {
    const { width, height } = shrunkSize(bitmap.width, bitmap.height);
    const canvas = this.document.createElement('canvas');
    canvas.width = width;
    canvas.height = height;
    const context = canvas.getContext('2d');
    if (!context) return { ok: false, reason: 'couldNotShrink' };
    context.imageSmoothingQuality = 'high';
    context.drawImage(bitmap, 0, 0, width, height);
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/jpeg', QUALITY));
    if (!blob) return { ok: false, reason: 'couldNotShrink' };
    const bytes = await blob.arrayBuffer();
    const [sha256, originalSha256] = await Promise.all([sha256Of(bytes), sha256Of(original)]);
    const capturedAt = Number.isFinite(takenMs) && takenMs > 0 ? new Date(takenMs).toISOString() : null;
    return { ok: true, photo: { bytes, sha256, originalSha256, width, height, capturedAt } };
  }
}
