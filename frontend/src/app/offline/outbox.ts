import { computed, DestroyRef, DOCUMENT, ErrorHandler, inject, Injectable, signal } from '@angular/core';
import type { Judgement } from '#shared/checklist/judgement';
import { DomainFailure } from '#shared/failures/failure';
import type { EntryId, SequenceId } from '#shared/plant/ids';
import { entryIdSchema } from '#shared/plant/ids';
import type { EntryContent } from '#shared/sequences/entry';
import { uuidv7 } from 'uuidv7';
import { PhoneDevice } from '../session/phone-device';
import { Session } from '../session/session';
import { backOff } from './back-off';
import { Delivery, type DeliveryEnd } from './delivery';
import { isStuck } from './delivery-batches';
import type { LocalPhoto, OutboxEntry } from './local-database';
import { OutboxStorage } from './outbox-storage';

const KEEP_SENT_PHOTOS_MS = 3 * 24 * 3_600_000;

/** What goes with a new entry beside its content. */
export interface EntryContext {
  readonly stepListHash: string | null;
  readonly supersedes: EntryId | null;
  readonly judgement: Judgement | null;
}

/**
 * Everything recorded on this phone that the server hasn't acknowledged yet. Recording never waits for the network: an
 * entry is stored, shown as done, and delivered whenever there is a way, as often as it takes.
 */
@Injectable({ providedIn: 'root' })
export class Outbox {
  private readonly storage = inject(OutboxStorage);
  private readonly delivery = inject(Delivery);
  private readonly session = inject(Session);
  private readonly phone = inject(PhoneDevice);
  private readonly document = inject(DOCUMENT);
  private readonly errors = inject(ErrorHandler);
  private readonly entriesHere = signal<readonly OutboxEntry[]>([]);
  private readonly photosHere = signal<readonly LocalPhoto[]>([]);
  private readonly lastEnd = signal<DeliveryEnd>('done');
  private readonly delivered = signal(0);
  private failures = 0;
  private running: Promise<void> | null = null;
  private runAgain = false;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private begun = false;

  /** Entries of the person who is here, each device's oldest first, refused ones among them. */
  readonly entries = this.entriesHere.asReadonly();
  readonly refused = computed(() => this.entriesHere().filter((entry) => entry.state === 'refused'));
  /** Still waiting, but the server failed on them again and again: kept, tried on, and people are told. */
  readonly stuck = computed(() => this.entriesHere().filter(isStuck));
  readonly refusedPhotos = computed(() => this.photosHere().filter((photo) => photo.state === 'refused'));
  readonly waitingCount = computed(
    () =>
      this.entriesHere().filter((entry) => entry.state === 'waiting').length +
      this.photosHere().filter((photo) => photo.state === 'waiting').length,
  );
  /** `signIn`: what waits goes out after the next sign-in. */
  readonly end = this.lastEnd.asReadonly();
  /** Goes up whenever something was acknowledged: whoever shows sequences reads the local copy anew. */
  readonly deliveries = this.delivered.asReadonly();

  constructor() {
    const wake = (): void => {
      if (this.begun && this.document.visibilityState === 'visible') this.drainSoon();
    };
    const window = this.document.defaultView;
    window?.addEventListener('online', wake);
    this.document.addEventListener('visibilitychange', wake);
    inject(DestroyRef).onDestroy(() => {
      clearTimeout(this.timer);
      window?.removeEventListener('online', wake);
      this.document.removeEventListener('visibilitychange', wake);
    });
  }

  /** Reads what is here for the person, and starts delivering. May be called again after another person signed in. */
  async begin(): Promise<void> {
    this.begun = true;
    // Asks the browser not to clear this store when the phone runs short of space; it may say no.
    await this.document.defaultView?.navigator.storage?.persist?.();
    await this.read();
    await this.storage.dropSentPhotos(new Date(Date.now() - KEEP_SENT_PHOTOS_MS).toISOString());
    await this.drain();
  }

  /**
   * Records: stored when this resolves, whatever the network does.
   *
   * @throws {DomainFailure} notSignedIn when nobody is here, or this browser was never registered as their device
   * @throws {DOMException} QuotaExceededError when the phone is full even after delivered photos made room
   */
  async append(sequenceId: SequenceId, content: EntryContent, context: EntryContext): Promise<OutboxEntry> {
    const author = this.session.me();
    const deviceId = this.phone.deviceId();
    if (!author || !deviceId)
      throw new DomainFailure('notSignedIn', 'This phone has to sign in once with a network');
    const fresh = {
      id: entryIdSchema.parse(uuidv7()),
      sequenceId,
      authorId: author.id,
      deviceId,
      serverLastCount: this.phone.lastCount(),
      deviceTime: new Date().toISOString(),
      content,
      ...context,
    };
    const entry = await this.makingRoom(() => this.storage.append(fresh));
    await this.read();
    this.drainSoon();
    return entry;
  }

  /** Stores a photo as a draft of its step. */
  async keepPhoto(photo: LocalPhoto): Promise<void> {
    await this.makingRoom(() => this.storage.keepPhoto(photo));
  }

  /** Puts a refused entry back in the queue. */
  async retry(id: EntryId): Promise<void> {
    await this.storage.retry(id);
    await this.read();
    this.drainSoon();
  }

  /** Puts everything that was refused back in the queue, after whatever stood against it was put right. */
  async retryAll(): Promise<void> {
    const now = new Date().toISOString();
    for (const entry of this.refused()) await this.storage.retry(entry.id);
    for (const photo of this.refusedPhotos()) await this.storage.markPhoto(photo, 'waiting', null, now);
    await this.read();
    this.drainSoon();
  }

  /** Delivers what waits. Calls during a run make it look once more at its end. */
  async drain(): Promise<void> {
    if (this.running) {
      this.runAgain = true;
      return this.running;
    }
    this.running = this.drainNow().finally(() => (this.running = null));
    await this.running;
    if (this.runAgain) {
      this.runAgain = false;
      await this.drain();
    }
  }

  private async drainNow(): Promise<void> {
    const author = this.session.me();
    if (!author || this.waitingCount() === 0) return;
    const run = async (): Promise<void> => {
      const end = await this.delivery.run(author.id, () => this.noteProgress());
      this.lastEnd.set(end);
      this.failures = end === 'done' ? 0 : this.failures + 1;
    };
    // One tab at a time. Sending twice does no harm, only wastes a phone's battery.
    const locks = this.document.defaultView?.navigator.locks as LockManager | undefined;
    await (locks ? locks.request('firstcold-outbox', run) : run());
    await this.read();
    this.schedule();
  }

  private schedule(): void {
    clearTimeout(this.timer);
    if (this.waitingCount() === 0) return;
    this.timer = setTimeout(() => this.drainSoon(), backOff(this.failures, Math.random()));
  }

  private drainSoon(): void {
    this.drain().catch((error: unknown) => {
      // The local store is gone for the moment; entries are safe in it, and the timer looks again. The rest is a bug.
      if (!(error instanceof DOMException)) this.errors.handleError(error);
      this.failures += 1;
      this.schedule();
    });
  }

  private async noteProgress(): Promise<void> {
    await this.read();
    this.delivered.update((count) => count + 1);
  }

  private async read(): Promise<void> {
    const me = this.session.me();
    this.entriesHere.set(me ? await this.storage.entriesOf(me.id) : []);
    if (!me) return this.photosHere.set([]);
    const [waiting, refused] = await Promise.all([
      this.storage.photos(me.id, 'waiting'),
      this.storage.photos(me.id, 'refused'),
    ]);
    this.photosHere.set([...waiting, ...refused]);
  }

  private async makingRoom<T>(store: () => Promise<T>): Promise<T> {
    try {
      return await store();
    } catch (error) {
      if (!(error instanceof DOMException) || error.name !== 'QuotaExceededError') throw error;
      await this.storage.dropSentPhotos(new Date().toISOString());
      return store();
    }
  }
}
