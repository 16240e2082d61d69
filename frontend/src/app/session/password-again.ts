import { inject, Injectable, Injector } from '@angular/core';
import { Router } from '@angular/router';

/** Asks for the password above the page that is open, so that the page keeps all that was typed on it. */
@Injectable({ providedIn: 'root' })
export class PasswordAgain {
  private readonly injector = inject(Injector);
  private readonly router = inject(Router);
  private asking: Promise<boolean> | null = null;

  /** Before a signature, when the password was last given too long ago. `false` when the person turned back. */
  ask(): Promise<boolean> {
    return this.openOnce('signature');
  }

  /** When the session ran out. Whoever turns back is led to the sign-in page, and from there back here. */
  async signInAgain(): Promise<boolean> {
    const isBack = await this.openOnce('session');
    if (!isBack) await this.router.navigate(['/sign-in'], { queryParams: { then: this.router.url } });
    return isBack;
  }

  private openOnce(purpose: 'signature' | 'session'): Promise<boolean> {
    // Several calls may fail at the same moment; one dialog serves them all.
    this.asking ??= this.open(purpose).finally(() => (this.asking = null));
    return this.asking;
  }

  private async open(purpose: 'signature' | 'session'): Promise<boolean> {
    const { openPasswordDialog } = await import('./password-dialog');
    return openPasswordDialog(this.injector, purpose);
  }
}
