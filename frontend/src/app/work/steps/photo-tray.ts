import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { PhotoRef } from '#shared/checklist/kinds/photo';
import type { PersonId, SequenceId } from '#shared/plant/ids';
import { NOTHING_YET } from '../photo-placeholder';
import type { LocalPhoto } from '../../offline/local-database';
import { Outbox } from '../../offline/outbox';
import { OutboxStorage } from '../../offline/outbox-storage';

/** A photo in the tray, with an address at which this page can show it. */
export interface TrayPhoto {
  readonly ref: PhotoRef;
  readonly url: string;
  readonly state: LocalPhoto['state'];
}

/** The reference that an entry names a photo by. */
export function refOf(photo: LocalPhoto): PhotoRef {
  const { sha256, originalSha256, width, height, capturedAt, bytes } = photo;
  return { sha256, originalSha256, width, height, capturedAt, bytes: bytes.byteLength };
}

/** The photos of one step before they are recorded: kept on the phone from the moment they are taken. */
@Injectable()
export class PhotoTray {
  private readonly storage = inject(OutboxStorage);
  private readonly outbox = inject(Outbox);
  private readonly inTray = signal<readonly TrayPhoto[]>([]);

  readonly photos = this.inTray.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => this.inTray().forEach((photo) => URL.revokeObjectURL(photo.url)));
  }

  /**
   * Takes up drafts that were left here, and the photos of the answer that is about to be corrected.
   *
   * @param arrived hashes of the photos that the server can show
   */
  async open(
    personId: PersonId,
    sequenceId: SequenceId,
    stepKey: string,
    recorded: readonly PhotoRef[],
    arrived: ReadonlySet<string>,
  ): Promise<void> {
    const drafts = await this.storage.photos(personId, 'draft');
    const mine = drafts.filter((photo) => photo.sequenceId === sequenceId && photo.stepKey === stepKey);
    const before = await Promise.all(
      recorded.map(async (ref): Promise<TrayPhoto> => {
        const local = await this.storage.photo(sequenceId, ref.sha256);
        if (local) return shown(local);
        const url = `/api/sequences/${sequenceId}/photos/${ref.sha256}?size=thumbnail`;
        // One that hasn't arrived from another phone can't be shown, and asking for it would only fail.
        return { ref, url: arrived.has(ref.sha256) ? url : NOTHING_YET, state: 'sent' };
      }),
    );
    this.inTray.set([...before, ...mine.map(shown)]);
  }

  /** @throws {DOMException} QuotaExceededError when the phone is full */
  async add(photo: LocalPhoto): Promise<void> {
    if (this.inTray().some((known) => known.ref.sha256 === photo.sha256)) return;
    await this.outbox.keepPhoto(photo);
    this.inTray.update((photos) => [...photos, shown(photo)]);
  }

  /** Takes a photo out of the answer. One that an earlier entry names stays stored; only a draft is deleted. */
  async remove(sequenceId: SequenceId, sha256: string): Promise<void> {
    const gone = this.inTray().find((photo) => photo.ref.sha256 === sha256);
    if (gone) URL.revokeObjectURL(gone.url);
    this.inTray.update((photos) => photos.filter((photo) => photo.ref.sha256 !== sha256));
    await this.storage.removeDraft(sequenceId, sha256);
  }
}

function shown(photo: LocalPhoto): TrayPhoto {
  const url = URL.createObjectURL(new Blob([photo.bytes], { type: 'image/jpeg' }));
  return { ref: refOf(photo), url, state: photo.state };
}
