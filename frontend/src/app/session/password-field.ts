import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  model,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { FirstIcon } from '../ui/first-icon/first-icon';

let boxes = 0;

/** The box for a password: pasting and password managers welcome, and it can be shown. */
@Component({
  selector: 'app-password-field',
  imports: [FirstIcon, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label [attr.for]="id">{{ 'session.password' | transloco }}</label>
    <div class="box">
      <input
        #box
        name="password"
        autocomplete="current-password"
        autocapitalize="none"
        spellcheck="false"
        required
        [id]="id"
        [type]="isShown() ? 'text' : 'password'"
        [value]="value()"
        [attr.aria-invalid]="isMissing()"
        [attr.aria-describedby]="isMissing() ? id + '-wrong' : null"
        (input)="value.set(box.value)"
      />
      <button
        type="button"
        [attr.aria-pressed]="isShown()"
        [attr.aria-label]="'session.showPassword' | transloco"
        (click)="isShown.set(!isShown())"
      >
        <app-first-icon [name]="isShown() ? 'hide' : 'show'" />
      </button>
    </div>
    @if (isMissing()) {
      <p class="wrong" [id]="id + '-wrong'">{{ 'session.passwordMissing' | transloco }}</p>
    }
  `,
  styleUrl: './session-field.scss',
})
export class PasswordField {
  readonly value = model.required<string>();
  /** Whether somebody tried to go on: a box that was left empty says so then. */
  readonly isTried = input(false);

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');
  protected readonly id = `password-${(boxes += 1)}`;
  protected readonly isShown = signal(false);
  protected readonly isMissing = computed(() => this.isTried() && this.value() === '');

  focus(): void {
    this.box().nativeElement.focus();
  }
}
