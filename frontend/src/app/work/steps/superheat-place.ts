import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { UnitSystem } from '#shared/units/unit-system';
import { QuantityBox } from './quantity-box';
import type { ReadHow } from './superheat-answer';

const PLACES = ['coilOutlet', 'elsewhere'] as const;

/** Where the pressure was read; anywhere but at the coil, what the line loses on the way has to be said. */
@Component({
  selector: 'app-superheat-place',
  imports: [QuantityBox, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details [open]="how().takenAt === 'elsewhere'">
      <summary>
        <span>{{ 'work.takenAt' | transloco }}:</span>&ngsp;
        <span [class]="how().takenAt === 'elsewhere' ? 'lacking' : 'state'">{{
          'work.takenAt_' + how().takenAt | transloco
        }}</span>
      </summary>
      <div class="inside">
        <fieldset>
          <legend class="heard-only">{{ 'work.takenAt' | transloco }}</legend>
          <div>
            @for (place of places; track place) {
              <label>
                <input
                  type="radio"
                  name="taken-at"
                  [checked]="how().takenAt === place"
                  (change)="howChange.emit({ takenAt: place })"
                />
                <span>{{ 'work.takenAt_' + place | transloco }}</span>
              </label>
            }
          </div>
        </fieldset>
        @if (how().takenAt === 'elsewhere') {
          <app-quantity-box
            dimension="pressureDifference"
            [label]="'work.lineDrop' | transloco"
            [unitSystem]="unitSystem()"
            [text]="how().lineDrop"
            (textChange)="howChange.emit({ lineDrop: $event })"
          />
          <p class="soft">{{ 'work.lineDropHint' | transloco }}</p>
        }
      </div>
    </details>
  `,
  styleUrls: ['./segments.scss', './superheat-rows.scss'],
})
export class SuperheatPlace {
  readonly how = input.required<ReadHow>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly howChange = output<Partial<ReadHow>>();

  protected readonly places = PLACES;
}
