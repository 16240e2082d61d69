import { computed, DOCUMENT, ErrorHandler, inject, Injectable, signal } from '@angular/core';
import { Connectivity } from '../offline/connectivity';
import { httpFailure } from '../session/problem-code';

/**
 * What went wrong beyond any page: a bug, an old page that asks for a file which a new version no longer has, or a part
 * of the application that isn't on this phone yet while there is no network to fetch it by.
 */
export type AppError = 'bug' | 'newVersion' | 'noNetwork';

/** The last resort. A page handles what it expects; what gets here is shown in a bar above it, and logged. */
@Injectable({ providedIn: 'root' })
export class AppErrors extends ErrorHandler {
  private readonly location = inject(DOCUMENT).location;
  private readonly last = signal<AppError | null>(null);

  private readonly online = inject(Connectivity).online;

  /** What to show. A lacking network is over once it is back: whatever failed then works. */
  readonly error = computed(() => (this.last() === 'noNetwork' && this.online() ? null : this.last()));
  /** Whether loading the page anew may help. Without a network it would only lose the page. */
  readonly mayReload = computed(() => this.online());

  override handleError(error: unknown): void {
    super.handleError(error);
    this.last.set(this.kindOf(error));
  }

  dismiss(): void {
    this.last.set(null);
  }

  reload(): void {
    this.location.reload();
  }

  private kindOf(error: unknown): AppError {
    if (!this.online() && isNotFetched(error)) return 'noNetwork';
    return isMissingChunk(error) ? 'newVersion' : 'bug';
  }
}

/** Whether something could not be fetched: code, a picture, or the answer to a call that no page took care of. */
export function isNotFetched(error: unknown): boolean {
  const text = error instanceof Error ? error.message : String(error);
  return (
    isMissingChunk(error) || httpFailure(error)?.status === 0 || /retrieving icon|Failed to fetch/i.test(text)
  );
}

/** Whether a part of the application could not be loaded, in the words of the three browser engines. */
export function isMissingChunk(error: unknown): boolean {
  const text = error instanceof Error ? error.message : String(error);
  return /dynamically imported module|Importing a module script failed|error loading dynamically/i.test(text);
}
