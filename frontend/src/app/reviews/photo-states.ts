import type { FoldEntry } from '#shared/sequences/fold';
import type { SequenceDetail } from '#shared/contracts/sequences';

export type PhotoStatus = SequenceDetail['photos'][number];

/** The photos of an entry that can't be looked at: not here yet, or broken. Numbered as they are shown, from 1. */
export function photosNotWell(
  entry: FoldEntry | null,
  photos: readonly PhotoStatus[],
): readonly { readonly number: number; readonly state: 'awaited' | 'broken' }[] {
  const content = entry?.body.content;
  if (content?.kind !== 'answer' || content.answer.kind !== 'photo') return [];
  return content.answer.photos.flatMap(({ sha256 }, index) => {
    const state = photos.find((photo) => photo.sha256 === sha256)?.state ?? 'awaited';
    return state === 'awaited' || state === 'broken' ? [{ number: index + 1, state }] : [];
  });
}

/** The hashes of an entry's photos, in the order in which they are shown. */
export function photosOf(entry: FoldEntry | null): readonly string[] {
  const content = entry?.body.content;
  return content?.kind === 'answer' && content.answer.kind === 'photo'
    ? content.answer.photos.map(({ sha256 }) => sha256)
    : [];
}
