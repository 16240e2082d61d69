import { DestroyRef, inject, Injectable } from '@angular/core';

const PAUSE_MS = 600;

/**
 * A breath after each recording. The next step's action stands where the last one's stood: the second half of a double
 * tap must not record something that nobody has read. It outlives the step, so it belongs to the page.
 */
@Injectable()
export class RecordPause {
  private paused = false;
  private timer: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    inject(DestroyRef).onDestroy(() => clearTimeout(this.timer));
  }

  get isOn(): boolean {
    return this.paused;
  }

  begin(): void {
    this.paused = true;
    clearTimeout(this.timer);
    this.timer = setTimeout(() => (this.paused = false), PAUSE_MS);
  }
}
