import { inject, Injectable, Injector } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { LanguageChoice } from './language-choice';

/**
 * What every page but the sign-in page needs: the words of all screens and the icons. It comes in one piece, so that a
 * phone which has shown one page has them for all.
 */
@Injectable({ providedIn: 'root' })
export class WholeApplication {
  private readonly injector = inject(Injector);
  private readonly language = inject(LanguageChoice);
  private loading: Promise<void> | null = null;

  /** Resolves once it is there; after a failure the next call tries again. */
  load(): Promise<void> {
    this.loading ??= this.fetch().catch((error: unknown) => {
      this.loading = null;
      throw error;
    });
    return this.loading;
  }

  private async fetch(): Promise<void> {
    const icons = import('./icons').then(({ registerIcons }) => registerIcons(this.injector));
    await Promise.all([this.language.loadAll(), icons]);
  }
}

/** Before every page that is not part of the first screen. */
export const wholeGuard: CanActivateFn = async () => {
  await inject(WholeApplication).load();
  return true;
};
