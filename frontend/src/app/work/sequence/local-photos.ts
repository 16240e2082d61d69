import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { SequenceId } from '#shared/plant/ids';
import { photosOf } from '../../offline/append-entry';
import { OutboxStorage } from '../../offline/outbox-storage';
import type { StepView } from '#shared/sequences/sequence-view';
import type { PhotoUrl } from '../../ui/answer-view/answer-view';

/** A picture of nothing: stands while it isn't known yet where a photo is, and for one that has not arrived anywhere. */
const NOTHING_YET = 'data:image/gif;base64,R0lGODlhAQABAAAAACH5BAEKAAEALAAAAAABAAEAAAICTAEAOw==';

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
    const fresh = new Map(this.urls());
    for (const sha256 of wanted) {
      if (fresh.has(sha256)) continue;
      const photo = await this.storage.photo(sequenceId, sha256);
      fresh.set(sha256, photo ? URL.createObjectURL(new Blob([photo.bytes], { type: 'image/jpeg' })) : null);
    }
    if (fresh.size > this.urls().size) this.urls.set(fresh);
  }

  /** @param awaited photos that have not reached the server: asking it for them would only fail */
  urlFor(sequenceId: SequenceId, awaited: ReadonlySet<string>): PhotoUrl {
    const urls = this.urls();
    return (sha256, size) => {
      const url = urls.get(sha256);
      if (url === undefined || (url === null && awaited.has(sha256))) return NOTHING_YET;
      return url ?? `/api/sequences/${sequenceId}/photos/${sha256}?size=${size}`;
    };
  }
}
