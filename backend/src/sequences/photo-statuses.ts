import type { SequenceDetail } from '#shared/contracts/sequences';
import type { EntryBody, StoredEntry } from '#shared/sequences/entry';
import type { PhotoEntity } from './photo.entity';

/** The hashes of the photos that an entry names. */
export function photosNamedBy({ content }: EntryBody): string[] {
  const isPhoto = content.kind === 'answer' && content.answer.kind === 'photo';
  return isPhoto && content.answer.kind === 'photo' ? content.answer.photos.map((photo) => photo.sha256) : [];
}

/** How far each photo that the entries name has come; one whose bytes aren't here yet is `awaited`. */
export function photoStatuses(
  entries: readonly StoredEntry[],
  rows: readonly Pick<PhotoEntity, 'sha256' | 'state'>[],
): SequenceDetail['photos'] {
  const known = new Map(
    rows.map((row) => [row.sha256, row.state as SequenceDetail['photos'][number]['state']]),
  );
  const named = entries.flatMap(({ body }) => photosNamedBy(body));
  return [...new Set(named)].map((sha256) => ({ sha256, state: known.get(sha256) ?? 'awaited' }));
}
