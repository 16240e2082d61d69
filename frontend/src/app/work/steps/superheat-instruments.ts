import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { GAUGE_KINDS } from '#shared/checklist/kinds/superheat';
import { UNITS } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { QuantityBox } from './quantity-box';
import { BAROMETER_UNIT } from './superheat-answer';
import type { TypedInstruments } from './superheat-typed';

/** What the reading is taken with, and how good its maker says it is. Kept by the phone: the gauge goes with it. */
@Component({
  selector: 'app-superheat-instruments',
  imports: [QuantityBox, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details>
      <summary>
        <span>{{ 'work.instruments' | transloco }}:</span>&ngsp;
        <span class="state"
          >{{ 'work.gauge_' + instruments().gauge | transloco
          }}{{ accuracies() ? ', ' + accuracies() : '' }}</span
        >
      </summary>
      <div class="inside">
        <fieldset>
          <legend>{{ 'work.gaugeKind' | transloco }}</legend>
          <div>
            @for (kind of kinds; track kind) {
              <label>
                <input
                  type="radio"
                  name="gauge-kind"
                  [checked]="instruments().gauge === kind"
                  (change)="change({ gauge: kind })"
                />
                <span>{{ 'work.gauge_' + kind | transloco }}</span>
              </label>
            }
          </div>
        </fieldset>
        <p class="soft">{{ 'work.gaugeHint_' + instruments().gauge | transloco }}</p>
        <app-quantity-box
          dimension="pressureDifference"
          [label]="'work.pressureAccuracy' | transloco"
          [unitSystem]="unitSystem()"
          [text]="instruments().pressureAccuracy"
          (textChange)="change({ pressureAccuracy: $event })"
        />
        <app-quantity-box
          dimension="temperatureDifference"
          [label]="'work.temperatureAccuracy' | transloco"
          [unitSystem]="unitSystem()"
          [withSign]="false"
          [text]="instruments().temperatureAccuracy"
          (textChange)="change({ temperatureAccuracy: $event })"
        />
        <app-quantity-box
          dimension="absolutePressure"
          [label]="'work.barometer' | transloco"
          [unitSystem]="unitSystem()"
          [inUnit]="barometerUnit()"
          [text]="instruments().barometer ?? ''"
          (textChange)="change({ barometer: $event })"
        />
        <p class="soft">{{ 'work.instrumentsHint' | transloco }}</p>
      </div>
    </details>
  `,
  styleUrls: ['./segments.scss', './superheat-rows.scss'],
})
export class SuperheatInstruments {
  readonly instruments = model.required<TypedInstruments>();
  readonly unitSystem = input.required<UnitSystem>();

  protected readonly kinds = GAUGE_KINDS;
  protected readonly barometerUnit = computed(() => BAROMETER_UNIT[this.unitSystem()]);
  protected readonly accuracies = computed(() => {
    const { pressureAccuracy, temperatureAccuracy } = this.instruments();
    const symbol = (dimension: 'pressureDifference' | 'temperatureDifference'): string =>
      UNITS[displayUnit(dimension, this.unitSystem())].symbol;
    return [
      pressureAccuracy.trim() && `± ${pressureAccuracy.trim()} ${symbol('pressureDifference')}`,
      temperatureAccuracy.trim() && `± ${temperatureAccuracy.trim()} ${symbol('temperatureDifference')}`,
    ]
      .filter((text) => text !== '')
      .join(', ');
  });

  protected change(change: Partial<TypedInstruments>): void {
    this.instruments.set({ ...this.instruments(), ...change });
  }
}
