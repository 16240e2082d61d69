import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { MethodField } from '#shared/checklist/methods/method';
import type { UnitSystem } from '#shared/units/unit-system';
import { TextOf } from '../../ui/text-of';
import type { TypedBoxes } from './measurement-typed';
import { QuantityBox } from './quantity-box';

let forms = 0;

/** The boxes of a method, or of one of its rows, in the order in which it declares them. */
@Component({
  selector: 'app-measurement-boxes',
  imports: [QuantityBox, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (field of fields(); track field.key) {
      @switch (field.kind) {
        @case ('quantity') {
          <app-quantity-box
            [label]="(field.label | appText) + (field.required ? '' : ' ' + ('work.ifKnown' | transloco))"
            [dimension]="field.dimension"
            [unitSystem]="unitSystem()"
            [describedBy]="describedBy()"
            [text]="boxes().quantities[field.key] ?? ''"
            (textChange)="changeQuantity(field.key, $event)"
          />
        }
        @case ('choice') {
          <fieldset>
            <legend>{{ field.label | appText }}</legend>
            <div>
              @for (option of field.options; track option.value) {
                <label>
                  <input
                    type="radio"
                    [name]="id + field.key"
                    [checked]="boxes().words[field.key] === option.value"
                    (change)="changeWord(field.key, option.value)"
                  />
                  <span>{{ option.label | appText }}</span>
                </label>
              }
            </div>
          </fieldset>
        }
        @case ('words') {
          <label class="words">
            <span>{{ field.label | appText }}</span>
            <input
              type="text"
              autocomplete="off"
              maxlength="200"
              [value]="boxes().words[field.key] ?? ''"
              (input)="takeWord(field.key, $event)"
            />
          </label>
        }
      }
    }
  `,
  styleUrls: ['./segments.scss', './measurement-boxes.scss'],
})
export class MeasurementBoxesForm {
  readonly fields = input.required<readonly MethodField[]>();
  readonly boxes = input.required<TypedBoxes>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly describedBy = input.required<string>();
  readonly boxesChange = output<TypedBoxes>();

  protected readonly id = `boxes-${(forms += 1)}-`;

  protected changeQuantity(key: string, text: string): void {
    const { quantities, words } = this.boxes();
    this.boxesChange.emit({ quantities: { ...quantities, [key]: text }, words });
  }

  protected changeWord(key: string, word: string): void {
    const { quantities, words } = this.boxes();
    this.boxesChange.emit({ quantities, words: { ...words, [key]: word } });
  }

  protected takeWord(key: string, event: Event): void {
    this.changeWord(key, (event.target as HTMLInputElement).value);
  }
}
