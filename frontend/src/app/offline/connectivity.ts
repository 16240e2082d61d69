import { computed, DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';

/** Whether the server can be reached: what the browser says, corrected by how the last call ended. */
@Injectable({ providedIn: 'root' })
export class Connectivity {
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly browserOnline = signal(this.window?.navigator.onLine ?? true);
  private readonly reached = signal(true);

  readonly online = computed(() => this.browserOnline() && this.reached());

  constructor() {
    const note = (): void => {
      this.browserOnline.set(this.window?.navigator.onLine ?? true);
      // A network that came back deserves a fresh try, whatever the last call said.
      if (this.browserOnline()) this.reached.set(true);
    };
    this.window?.addEventListener('online', note);
    this.window?.addEventListener('offline', note);
    inject(DestroyRef).onDestroy(() => {
      this.window?.removeEventListener('online', note);
      this.window?.removeEventListener('offline', note);
    });
  }

  /** A call got an answer from the server, or none at all. */
  report(isReached: boolean): void {
    this.reached.set(isReached);
  }
}
