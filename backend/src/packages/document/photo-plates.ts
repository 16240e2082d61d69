import type { PhotoRef } from '#shared/checklist/kinds/photo';
import { isPlaceableJpeg, type PhotoPlate } from '../../pdf/photo-row';
import type { CircuitContext } from './judged-entry';

/** A step's photos as plates: when each was taken and how its hash begins; one that is missing says why. */
export function photoPlates(
  circuit: CircuitContext,
  photos: readonly PhotoRef[],
  title: string,
): PhotoPlate[] {
  const { context, detail } = circuit;
  const { words, format } = context;
  const states = new Map(detail.photos.map((photo) => [photo.sha256, photo.state]));
  return photos.map((photo) => {
    const when = photo.capturedAt === null ? words.photo.timeUnknown : format.dateTime(photo.capturedAt);
    const missing = states.get(photo.sha256) === 'awaited' ? words.photo.awaited : words.photo.broken;
    return {
      width: photo.width,
      height: photo.height,
      caption: [title, words.photo.caption(when, photo.sha256.slice(0, 12))],
      alt: words.photo.alt(title),
      load: async () => {
        const bytes = await context.loadPhoto(detail.id, photo.sha256);
        if (bytes === 'skip') return bytes;
        return { bytes: bytes !== null && isPlaceableJpeg(bytes) ? bytes : null, missing };
      },
    };
  });
}
