import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { QuantityOf } from '../../ui/quantity-of';
import type { Dimension } from '#shared/units/unit';
import type { UnitSystem } from '#shared/units/unit-system';

/** What a value is wanted to be, in words and before it is typed; nothing where nothing is asked for. */
@Component({
  selector: 'app-wanted-limits',
  imports: [QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (key(); as key) {
      {{
        key
          | transloco
            : {
                low: (low() | appQuantity: dimension() : unitSystem()),
                high: (high() | appQuantity: dimension() : unitSystem()),
              }
      }}
    }
  `,
  styles: `
    :host {
      font-weight: 500;
    }
  `,
})
export class WantedLimits {
  /** SI; `null` where that side is open. */
  readonly low = input.required<number | null>();
  readonly high = input.required<number | null>();
  readonly dimension = input.required<Dimension>();
  readonly unitSystem = input.required<UnitSystem>();

  protected readonly key = computed(() => {
    if (this.low() === null) return this.high() === null ? null : 'ui.strip_limitsHigh';
    return this.high() === null ? 'ui.strip_limitsLow' : 'ui.strip_limitsLowHigh';
  });
}
