import { DOCUMENT, inject, Injectable, signal } from '@angular/core';

export const LOOKS = ['system', 'light', 'dark'] as const;
export type Look = (typeof LOOKS)[number];

const KEY = 'firstcold.look';

/** Light, dark, or what the phone says. Kept in this browser only. */
@Injectable({ providedIn: 'root' })
export class LookChoice {
  private readonly document = inject(DOCUMENT);
  private readonly chosen = signal<Look>(
    LOOKS.find((look) => look === localStorage.getItem(KEY)) ?? 'system',
  );

  readonly look = this.chosen.asReadonly();

  choose(look: Look): void {
    this.chosen.set(look);
    localStorage.setItem(KEY, look);
    this.apply();
  }

  /** Writes the choice to the page, where the tokens follow `color-scheme`. */
  apply(): void {
    if (this.chosen() === 'system') delete this.document.documentElement.dataset['look'];
    else this.document.documentElement.dataset['look'] = this.chosen();
  }
}
