import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { SequenceFacts } from '#shared/checklist/facts';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { QuantityOf } from '../../ui/quantity-of';
import { QuantityBox } from './quantity-box';
import type { ReadHow } from './superheat-answer';
import { livePair } from './superheat-live';
import type { TypedPair } from './superheat-typed';

/** Pressure and line temperature read together, and what they give at once: saturation (dew) and superheat. */
@Component({
  selector: 'app-pair-boxes',
  imports: [QuantityBox, QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (heading()) {
      <h4>{{ heading() }}</h4>
    }
    <app-quantity-box
      dimension="gaugePressure"
      [label]="'work.suctionPressure' | transloco"
      [unitSystem]="facts().unitSystem"
      [text]="pair().pressure"
      (textChange)="pair.set({ pressure: $event, temperature: pair().temperature })"
    />
    <app-quantity-box
      dimension="temperature"
      [label]="'work.lineTemperature' | transloco"
      [unitSystem]="facts().unitSystem"
      [text]="pair().temperature"
      (textChange)="pair.set({ pressure: pair().pressure, temperature: $event })"
    />
    <dl aria-live="polite">
      <div class="cold">
        <dt>{{ 'work.saturation' | transloco }}</dt>
        <dd class="figures">
          @if (live().saturationK !== null) {
            {{ live().saturationK! | appQuantity: 'temperature' : facts().unitSystem }}
          } @else {
            &mdash;
          }
        </dd>
      </div>
      <div>
        <dt>{{ 'work.superheat' | transloco }}</dt>
        <dd class="figures">
          @if (live().superheatK !== null) {
            {{ live().superheatK! | appQuantity: 'temperatureDifference' : facts().unitSystem }}
          } @else {
            &mdash;
          }
        </dd>
      </div>
    </dl>
  `,
  styleUrl: './pair-boxes.scss',
})
export class PairBoxes {
  readonly heading = input('');
  readonly step = input.required<SuperheatStep>();
  readonly facts = input.required<SequenceFacts>();
  readonly how = input.required<ReadHow>();
  readonly pair = model.required<TypedPair>();

  protected readonly live = computed(() => livePair(this.pair(), this.step(), this.facts(), this.how()));
}
