import { ChangeDetectionStrategy, Component, inject, input, signal, viewChild } from '@angular/core';
import { Router } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { EmailField, isEmail } from './email-field';
import { homeOf } from './role-home';
import { PasswordField } from './password-field';
import { safeTarget } from './safe-target';
import { Session } from './session';
import { signInProblem } from './sign-in-problem';

/**
 * Email and password, and then on to where the person wanted to go. The first thing that a phone loads, often over a
 * bad network: it is made of the browser's own boxes, without Material and forms.
 */
@Component({
  selector: 'app-sign-in-page',
  imports: [EmailField, PasswordField, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sign-in-page.html',
  styleUrl: './sign-in-page.scss',
})
export class SignInPage {
  /** The address that asked for signing in. */
  readonly then = input<string>();

  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly emailField = viewChild.required(EmailField);
  private readonly passwordField = viewChild.required(PasswordField);
  protected readonly email = signal(this.session.me()?.email ?? '');
  protected readonly password = signal('');
  protected readonly isTried = signal(false);
  protected readonly problem = signal<string | null>(null);
  protected readonly isBusy = signal(false);

  protected async signIn(event: Event): Promise<void> {
    event.preventDefault();
    if (this.isBusy() || !this.isFilledIn()) return;
    this.isBusy.set(true);
    this.problem.set(null);
    try {
      const me = await this.session.signIn(this.email().trim(), this.password());
      await this.router.navigateByUrl(safeTarget(this.then()) ?? homeOf(me), { replaceUrl: true });
    } catch (error) {
      this.problem.set(signInProblem(error));
    } finally {
      this.isBusy.set(false);
    }
  }

  /** Shows what is wrong with either box and leads to the first of them. */
  private isFilledIn(): boolean {
    this.isTried.set(true);
    if (!isEmail(this.email())) this.emailField().focus();
    else if (this.password() === '') this.passwordField().focus();
    else return true;
    return false;
  }
}
