import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { SequenceFacts } from '#shared/checklist/facts';
import { QuantityOf } from '../../ui/quantity-of';
import { explainGauge } from './explain-gauge';
import type { ReadHow } from './superheat-answer';

/** Why a digital gauge shows another saturation temperature than this page, with the numbers of this store. */
@Component({
  selector: 'app-gauge-explained',
  imports: [QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details>
      <summary>{{ 'work.gaugeWhy' | transloco }}</summary>
      <div class="inside">
        <p class="soft">
          {{
            'work.gaugeAtmosphere'
              | transloco
                : {
                    elevation: (facts().elevationM | appQuantity: 'length' : facts().unitSystem : 0),
                    atmosphere:
                      (facts().atmospherePaAbs | appQuantity: 'absolutePressure' : facts().unitSystem),
                  }
          }}
        </p>
        @if (explained(); as told) {
          <dl class="lines">
            @for (line of told.lines; track line.key) {
              <div>
                <dt>{{ 'work.' + line.key | transloco }}</dt>
                <dd class="figures">{{ line.valueK | appQuantity: line.dimension : facts().unitSystem }}</dd>
              </div>
            }
          </dl>
          <p>
            {{
              'work.gaugeCause_' + told.cause
                | transloco
                  : {
                      difference:
                        (told.differenceK | appQuantity: 'temperatureDifference' : facts().unitSystem),
                    }
            }}
          </p>
          <p class="soft">{{ 'work.gaugeDew' | transloco }}</p>
        } @else {
          <p class="soft">{{ 'work.gaugeTypeFirst' | transloco }}</p>
        }
      </div>
    </details>
  `,
  styleUrl: './superheat-rows.scss',
})
export class GaugeExplained {
  readonly facts = input.required<SequenceFacts>();
  readonly how = input.required<ReadHow>();
  /** As typed, of the reading in sight. */
  readonly pressure = input.required<string>();

  protected readonly explained = computed(() =>
    explainGauge(this.pressure(), this.how().instruments.gauge, this.facts()),
  );
}
