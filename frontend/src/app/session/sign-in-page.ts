import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { Router } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { homeOf } from './role-home';
import { PasswordField } from './password-field';
import { safeTarget } from './safe-target';
import { Session } from './session';
import { signInProblem } from './sign-in-problem';

/** Email and password, and then on to where the person wanted to go. */
@Component({
  selector: 'app-sign-in-page',
  imports: [
    MatButtonModule,
    MatFormFieldModule,
    MatInputModule,
    PasswordField,
    ReactiveFormsModule,
    TranslocoPipe,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sign-in-page.html',
  styleUrl: './sign-in-page.scss',
})
export class SignInPage {
  /** The address that asked for signing in. */
  readonly then = input<string>();

  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: [this.session.me()?.email ?? '', [Validators.required, Validators.email]],
    password: ['', Validators.required],
  });
  protected readonly problem = signal<string | null>(null);
  protected readonly isBusy = signal(false);

  protected async signIn(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.isBusy()) return;
    const { email, password } = this.form.getRawValue();
    this.isBusy.set(true);
    this.problem.set(null);
    try {
      const me = await this.session.signIn(email.trim(), password);
      await this.router.navigateByUrl(safeTarget(this.then()) ?? homeOf(me), { replaceUrl: true });
    } catch (error) {
      this.problem.set(signInProblem(error));
    } finally {
      this.isBusy.set(false);
    }
  }
}
