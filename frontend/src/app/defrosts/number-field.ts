import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import { fromSi, toSi } from '#shared/units/convert';
import { parseNumber } from '#shared/units/parse-number';
import { roundTo } from '#shared/units/round';
import { UNITS, type UnitId } from '#shared/units/unit';

/** One figure as it is typed, in a unit; what can't be read or lies outside stays on the screen and is told. */
@Component({
  selector: 'app-number-field',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <label *transloco="let t">
      <span class="label">{{ label() }}</span>
      <span class="box">
        <input
          #box
          type="text"
          inputmode="decimal"
          autocomplete="off"
          [value]="text()"
          [placeholder]="placeholder()"
          [readOnly]="readOnly()"
          [attr.aria-invalid]="isFaulty()"
          (input)="type(box.value)"
        />
        <span class="unit">{{ symbol() }}</span>
      </span>
      @if (isFaulty()) {
        <span class="fault" role="alert">{{
          t(most() < 1e9 ? 'defrosts.figureFault' : 'defrosts.figureFaultOpen', {
            least: shown(least()),
            most: shown(most()),
            unit: symbol(),
          })
        }}</span>
      } @else if (hint()) {
        <span class="hint">{{ hint() }}</span>
      }
    </label>
  `,
  styleUrl: './field.scss',
})
export class NumberField {
  readonly label = input.required<string>();
  readonly hint = input('');
  readonly placeholder = input('');
  /** In the SI unit of `unit`'s dimension; `null`: nothing given. */
  readonly value = input.required<number | null>();
  readonly unit = input.required<UnitId>();
  /** SI, both allowed. */
  readonly least = input(0);
  readonly most = input(1e9);
  readonly isNeeded = input(false);
  readonly readOnly = input(false);
  readonly changed = output<number | null>();
  readonly faulty = output<boolean>();

  protected readonly symbol = computed(() => UNITS[this.unit()].symbol);
  /** Typed text stays as it is while it means the value; a value from elsewhere replaces it. */
  protected readonly text = linkedSignal<number | null, string>({
    source: this.value,
    computation: (value, before) => {
      if (before && this.isSame(this.valueOf(before.value), value)) return before.value;
      return value === null ? '' : this.shown(value);
    },
  });
  protected readonly isFaulty = computed(() => this.valueOf(this.text()) === undefined);

  protected type(text: string): void {
    this.text.set(text);
    const value = this.valueOf(text);
    this.faulty.emit(value === undefined);
    if (value !== undefined) this.changed.emit(value);
  }

  protected shown(value: number): string {
    return String(roundTo(fromSi(value, this.unit()), 2));
  }

  /** `null` for an empty field, `undefined` for one that can't be read. */
  private valueOf(text: string): number | null | undefined {
    if (text.trim() === '') return this.isNeeded() ? undefined : null;
    const parsed = parseNumber(text);
    if (!parsed.ok) return undefined;
    const value = toSi(parsed.value, this.unit());
    return value >= this.least() - 1e-9 && value <= this.most() + 1e-9 ? value : undefined;
  }

  private isSame(first: number | null | undefined, second: number | null): boolean {
    if (first === undefined || first === null || second === null) return first === second;
    return Math.abs(first - second) <= 1e-9 * Math.max(1, Math.abs(second));
  }
}
