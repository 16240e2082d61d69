import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { SequenceId } from '#shared/plant/ids';
import { photosOf } from '../../offline/append-entry';
import { OutboxStorage } from '../../offline/outbox-storage';
import type { StepView } from '#shared/sequences/sequence-view';
import type { PhotoUrl } from '../../ui/answer-view/answer-view';

/** Where photos are shown from: this phone while it has them, which works without a network, else the server. */
@Injectable()
export class LocalPhotos {
  private readonly storage = inject(OutboxStorage);
  private readonly urls = signal<ReadonlyMap<string, string>>(new Map());

  constructor() {
    inject(DestroyRef).onDestroy(() => this.urls().forEach((url) => URL.revokeObjectURL(url)));
  }

  /** Makes addresses for the photos of a step that are on this phone and have none yet. */
  async show(sequenceId: SequenceId, view: StepView): Promise<void> {
    const wanted = view.history.flatMap((entry) => photosOf(entry.body.content));
    const fresh = new Map(this.urls());
    for (const sha256 of wanted) {
      if (fresh.has(sha256)) continue;
      const photo = await this.storage.photo(sequenceId, sha256);
      if (photo) fresh.set(sha256, URL.createObjectURL(new Blob([photo.bytes], { type: 'image/jpeg' })));
    }
    if (fresh.size > this.urls().size) this.urls.set(fresh);
  }

  urlFor(sequenceId: SequenceId): PhotoUrl {
    const urls = this.urls();
    return (sha256, size) => urls.get(sha256) ?? `/api/sequences/${sequenceId}/photos/${sha256}?size=${size}`;
  }
}
