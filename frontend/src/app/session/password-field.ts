import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { ReactiveFormsModule, type FormControl } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatIconModule } from '@angular/material/icon';
import { MatInputModule } from '@angular/material/input';
import { TranslocoPipe } from '@jsverse/transloco';

/** The box for a password: pasting and password managers welcome, and it can be shown. */
@Component({
  selector: 'app-password-field',
  imports: [
    ReactiveFormsModule,
    MatButtonModule,
    MatFormFieldModule,
    MatIconModule,
    MatInputModule,
    TranslocoPipe,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <mat-form-field appearance="outline">
      <mat-label>{{ 'session.password' | transloco }}</mat-label>
      <input
        matInput
        name="password"
        autocomplete="current-password"
        autocapitalize="none"
        spellcheck="false"
        [type]="isShown() ? 'text' : 'password'"
        [formControl]="control()"
      />
      <button
        matSuffix
        matIconButton
        type="button"
        [attr.aria-pressed]="isShown()"
        [attr.aria-label]="'session.showPassword' | transloco"
        (click)="isShown.set(!isShown())"
      >
        <mat-icon [svgIcon]="isShown() ? 'hide' : 'show'" />
      </button>
      <mat-error>{{ 'session.passwordMissing' | transloco }}</mat-error>
    </mat-form-field>
  `,
  styles: 'mat-form-field { width: 100%; }',
})
export class PasswordField {
  readonly control = input.required<FormControl<string>>();
  protected readonly isShown = signal(false);
}
