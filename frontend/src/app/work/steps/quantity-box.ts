import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { UNITS, type Dimension } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { turnSign } from './typed-text';

const MAY_BE_NEGATIVE: ReadonlySet<Dimension> = new Set([
  'temperature',
  'temperatureDifference',
  'gaugePressure',
]);

/** A large box for one number as an instrument shows it, its unit beside it, and a key that turns the sign. */
@Component({
  selector: 'app-quantity-box',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label>
      <span class="label">{{ label() }}</span>
      <span class="row" [class.large]="size() === 'large'">
        @if (hasSign()) {
          <button
            type="button"
            [attr.aria-label]="'work.turnSign' | transloco"
            (click)="text.set(turn(text()))"
          >
            &plus;/&minus;
          </button>
        }
        <input
          class="figures"
          type="text"
          inputmode="decimal"
          autocomplete="off"
          enterkeyhint="done"
          maxlength="40"
          [value]="text()"
          [attr.aria-describedby]="describedBy()"
          (input)="take($event)"
        />
        <span class="unit figures">{{ unit() }}</span>
      </span>
    </label>
  `,
  styleUrl: './quantity-box.scss',
})
export class QuantityBox {
  readonly label = input.required<string>();
  readonly dimension = input.required<Dimension>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly size = input<'medium' | 'large'>('medium');
  /** Id of the element that says how the value is judged. */
  readonly describedBy = input<string | null>(null);
  readonly text = model.required<string>();

  protected readonly unit = computed(() => UNITS[displayUnit(this.dimension(), this.unitSystem())].symbol);
  protected readonly hasSign = computed(() => MAY_BE_NEGATIVE.has(this.dimension()));
  protected readonly turn = turnSign;

  protected take(event: Event): void {
    this.text.set((event.target as HTMLInputElement).value);
  }
}
