import { DestroyRef, inject, InjectionToken, signal, type Signal } from '@angular/core';

/** The phone's clock in milliseconds; a spec gives its own. */
export const NOW_MS = new InjectionToken<() => number>('the phone’s clock', {
  providedIn: 'root',
  factory: () => () => Date.now(),
});

const EVERY_MS = 1_000;

/**
 * The phone's clock as a signal that goes on while its component lives. It only asks the clock, again at once when the
 * phone wakes up: a phone that sleeps or closes the page loses no time.
 */
export function ticking(): Signal<number> {
  const nowMs = inject(NOW_MS);
  const now = signal(nowMs());
  const tick = (): void => now.set(nowMs());
  const timer = setInterval(tick, EVERY_MS);
  document.addEventListener('visibilitychange', tick);
  inject(DestroyRef).onDestroy(() => {
    clearInterval(timer);
    document.removeEventListener('visibilitychange', tick);
  });
  return now.asReadonly();
}
