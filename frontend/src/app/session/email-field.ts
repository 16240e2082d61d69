import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  model,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';

/** Whether a text has the shape of an email address; whether it is somebody's, only the server knows. */
export const isEmail = (text: string): boolean => /^[^\s@]+@[^\s@]+$/.test(text.trim());

/** The box for the email address that somebody signs in with. */
@Component({
  selector: 'app-email-field',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label for="email">{{ 'session.email' | transloco }}</label>
    <input
      #box
      id="email"
      type="email"
      name="email"
      inputmode="email"
      autocomplete="username"
      autocapitalize="none"
      spellcheck="false"
      required
      [value]="value()"
      [attr.aria-invalid]="isWrong()"
      [attr.aria-describedby]="isWrong() ? 'email-wrong' : null"
      (input)="value.set(box.value)"
    />
    @if (isWrong()) {
      <p class="wrong" id="email-wrong">{{ 'session.emailWrong' | transloco }}</p>
    }
  `,
  styleUrl: './session-field.scss',
})
export class EmailField {
  readonly value = model.required<string>();
  /** Whether somebody tried to go on: an address that can't be one says so then. */
  readonly isTried = input(false);

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');
  protected readonly isWrong = computed(() => this.isTried() && !isEmail(this.value()));

  focus(): void {
    this.box().nativeElement.focus();
  }
}
