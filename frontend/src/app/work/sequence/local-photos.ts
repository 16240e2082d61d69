import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { photosOf } from '../../offline/append-entry';
import { OutboxStorage } from '../../offline/outbox-storage';
import type { StepView } from '#shared/sequences/sequence-view';
import type { PhotoUrl } from '../../ui/answer-view/answer-view';
import { NOTHING_YET } from '../photo-placeholder';

/** Where photos are shown from: this phone while it has them, which works without a network, else the server. */
@Injectable()
export class LocalPhotos {
  private readonly storage = inject(OutboxStorage);
  /** By hash; `null` for one that was looked for and isn't on this phone. */
  private readonly urls = signal<ReadonlyMap<string, string | null>>(new Map());

  constructor() {
    inject(DestroyRef).onDestroy(() => this.urls().forEach((url) => url && URL.revokeObjectURL(url)));
  }

  /** Makes addresses for the photos of a step that are on this phone and have none yet. */
  async show(sequenceId: SequenceId, view: StepView): Promise<void> {
    const wanted = view.history.flatMap((entry) => photosOf(entry.body.content));
    for (const sha256 of wanted) {
      if (this.urls().has(sha256)) continue;
      const photo = await this.storage.photo(sequenceId, sha256);
      // Another look may have found it meanwhile.
      if (this.urls().has(sha256)) continue;
      const url = photo ? URL.createObjectURL(new Blob([photo.bytes], { type: 'image/jpeg' })) : null;
      this.urls.update((urls) => new Map(urls).set(sha256, url));
    }
  }

  /** @param arrived photos that the server is known to have: asking it for any other would only fail */
  urlFor(sequenceId: SequenceId, arrived: ReadonlySet<string>): PhotoUrl {
    const urls = this.urls();
    return (sha256, size) => {
      const url = urls.get(sha256);
      if (url) return url;
      // Not looked for yet, or neither here nor there.
      if (url === undefined || !arrived.has(sha256)) return NOTHING_YET;
      return `/api/sequences/${sequenceId}/photos/${sha256}?size=${size}`;
    };
  }
}

/** The photos that the server can show; one that it found broken it keeps, and can't. */
export function arrivedPhotos(photos: SequenceDetail['photos']): ReadonlySet<string> {
  const there = photos.filter(({ state }) => state === 'received' || state === 'checked');
  return new Set(there.map(({ sha256 }) => sha256));
}
