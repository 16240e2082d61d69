import { DOCUMENT, ErrorHandler, inject, Injectable, signal } from '@angular/core';

/** What went wrong beyond any page: a bug, or an old page that asks for a file which a new version no longer has. */
export type AppError = 'bug' | 'newVersion';

/** The last resort. A page handles what it expects; what gets here is shown in a bar above it, and logged. */
@Injectable({ providedIn: 'root' })
export class AppErrors extends ErrorHandler {
  private readonly location = inject(DOCUMENT).location;
  private readonly last = signal<AppError | null>(null);

  readonly error = this.last.asReadonly();

  override handleError(error: unknown): void {
    super.handleError(error);
    this.last.set(isMissingChunk(error) ? 'newVersion' : 'bug');
  }

  dismiss(): void {
    this.last.set(null);
  }

  reload(): void {
    this.location.reload();
  }
}

/** Whether a part of the application could not be loaded, in the words of the three browser engines. */
export function isMissingChunk(error: unknown): boolean {
  const text = error instanceof Error ? error.message : String(error);
  return /dynamically imported module|Importing a module script failed|error loading dynamically/i.test(text);
}
