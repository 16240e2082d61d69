import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { UNITS, type Dimension, type UnitId } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { turnSign } from './typed-text';

const MAY_BE_NEGATIVE: ReadonlySet<Dimension> = new Set([
  'temperature',
  'temperatureDifference',
  'gaugePressure',
]);

let boxes = 0;

/** A large box for one number as an instrument shows it, its unit beside it, and a key that turns the sign. */
@Component({
  selector: 'app-quantity-box',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <div class="box">
      <label class="label" [attr.for]="id">{{ label() }}</label>
      <div class="row" [class.large]="size() === 'large'">
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
          [id]="id"
          type="text"
          inputmode="decimal"
          autocomplete="off"
          enterkeyhint="done"
          maxlength="40"
          [value]="text()"
          [attr.aria-describedby]="describedBy() ? id + '-unit ' + describedBy() : id + '-unit'"
          (input)="take($event)"
        />
        <span class="unit figures" [id]="id + '-unit'">{{ unit() }}</span>
      </div>
    </div>
  `,
  styleUrl: './quantity-box.scss',
})
export class QuantityBox {
  readonly label = input.required<string>();
  readonly dimension = input.required<Dimension>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly size = input<'medium' | 'large'>('medium');
  /** Whether there is a key for the sign, where a value of the dimension may be negative. */
  readonly withSign = input(true);
  /** Where an instrument shows another unit than the opening's screens do. */
  readonly inUnit = input<UnitId | null>(null);
  /** Id of the element that says how the value is judged. */
  readonly describedBy = input<string | null>(null);
  readonly text = model.required<string>();

  // The sign key stands beside the label, never in it: touching a label's words acts on the first control inside.
  protected readonly id = `quantity-${(boxes += 1)}`;

  protected readonly unit = computed(
    () => UNITS[this.inUnit() ?? displayUnit(this.dimension(), this.unitSystem())].symbol,
  );
  protected readonly hasSign = computed(() => this.withSign() && MAY_BE_NEGATIVE.has(this.dimension()));
  protected readonly turn = turnSign;

  protected take(event: Event): void {
    this.text.set((event.target as HTMLInputElement).value);
  }
}
