import { computed, effect, inject, Injectable, Injector, signal, type Signal } from '@angular/core';
import type { PersonId } from '#shared/plant/ids';
import { Session } from '../session/session';

const START_AFTER_MS = 1_500;

/**
 * Starts the outbox once somebody is here, wherever they are in the application: what was recorded yesterday goes out
 * even when today starts on another page. Its code is loaded after the first page, not with it.
 */
@Injectable({ providedIn: 'root' })
export class OutboxStart {
  private readonly injector = inject(Injector);
  private readonly me = inject(Session).me;
  private lastHere: PersonId | null = null;
  private readonly count = signal<Signal<number> | null>(null);

  /** How many entries and photos still wait on this phone; 0 while that isn't known yet. */
  readonly waiting = computed(() => (this.me() ? (this.count()?.() ?? 0) : 0));

  constructor() {
    effect((onCleanup) => {
      const me = this.me();
      const before = this.lastHere;
      this.lastHere = me?.id ?? null;
      if (before && before !== this.lastHere) void this.forget(before);
      if (!me) return;
      const timer = setTimeout(() => void this.start(), START_AFTER_MS);
      onCleanup(() => clearTimeout(timer));
    });
  }

  /** A phone is handed on: the next person finds nothing of what the one before could read. */
  private async forget(personId: PersonId): Promise<void> {
    const { SequenceCache } = await import('../offline/sequence-cache');
    await this.injector.get(SequenceCache).forget(personId);
  }

  private async start(): Promise<void> {
    const { Outbox } = await import('../offline/outbox');
    const outbox = this.injector.get(Outbox);
    this.count.set(outbox.waitingCount);
    await outbox.begin();
  }
}
