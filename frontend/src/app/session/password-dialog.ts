import { ChangeDetectionStrategy, Component, inject, signal, viewChild, type Injector } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialog, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { TranslocoPipe } from '@jsverse/transloco';
import { firstValueFrom } from 'rxjs';
import { PasswordField } from './password-field';
import { Session } from './session';
import { SessionApi } from './session-api';
import { signInProblem } from './sign-in-problem';

type Purpose = 'signature' | 'session';

/** A small dialog with one box. It closes with `true` only when the server took the password. */
@Component({
  selector: 'app-password-dialog',
  imports: [MatButtonModule, MatDialogModule, PasswordField, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <form novalidate (submit)="confirm($event)">
      <h2 mat-dialog-title>{{ 'session.againTitle_' + purpose | transloco }}</h2>
      <mat-dialog-content>
        <p class="why">{{ 'session.againWhy_' + purpose | transloco }}</p>
        <input
          class="heard-only"
          autocomplete="username"
          readonly
          tabindex="-1"
          aria-hidden="true"
          [value]="email"
        />
        <app-password-field [(value)]="password" [isTried]="isTried()" />
        <p class="problem" role="alert">
          @if (problem(); as key) {
            {{ key | transloco }}
          }
        </p>
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" [mat-dialog-close]="false">{{ 'session.cancel' | transloco }}</button>
        <button matButton="filled" type="submit" [attr.aria-disabled]="isBusy()">
          {{ 'session.confirm' | transloco }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    .why {
      margin-bottom: var(--app-space-4);
    }
    .problem {
      color: var(--app-plum);
      font-weight: 500;
      min-height: 1.5em;
    }
  `,
})
export class PasswordDialog {
  private readonly session = inject(Session);
  private readonly api = inject(SessionApi);
  private readonly reference = inject<MatDialogRef<PasswordDialog, boolean>>(MatDialogRef);
  protected readonly purpose = inject<Purpose>(MAT_DIALOG_DATA);
  protected readonly email = this.session.me()?.email ?? '';
  private readonly field = viewChild.required(PasswordField);
  protected readonly password = signal('');
  protected readonly isTried = signal(false);
  protected readonly problem = signal<string | null>(null);
  protected readonly isBusy = signal(false);

  protected async confirm(event: Event): Promise<void> {
    event.preventDefault();
    this.isTried.set(true);
    const password = this.password();
    if (password === '') this.field().focus();
    if (password === '' || this.isBusy()) return;
    this.isBusy.set(true);
    this.problem.set(null);
    try {
      if (this.purpose === 'signature') await this.api.confirmPassword(password);
      else await this.session.signIn(this.email, password);
      this.reference.close(true);
    } catch (error) {
      this.problem.set(signInProblem(error));
    } finally {
      this.isBusy.set(false);
    }
  }
}

/** Opens the dialog and waits for it. A function beside it, so that Material's dialogs load only when one opens. */
export async function openPasswordDialog(injector: Injector, purpose: Purpose): Promise<boolean> {
  const reference = injector.get(MatDialog).open<PasswordDialog, Purpose, boolean>(PasswordDialog, {
    data: purpose,
    width: '420px',
    maxWidth: '94vw',
  });
  return (await firstValueFrom(reference.afterClosed())) === true;
}
