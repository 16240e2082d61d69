import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { QuantityOf } from '../ui/quantity-of';

/** What the circuit was designed for, fixture by fixture: the evidence is read against this. */
@Component({
  selector: 'app-circuit-facts',
  imports: [QuantityOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details *transloco="let t; prefix: 'reviews'">
      <summary>{{ t('specification', { revision: specification().revision }) }}</summary>
      <div class="scroll">
        <table>
          <thead>
            <tr>
              <th scope="col">{{ t('fixture') }}</th>
              <th scope="col">{{ t('evaporating') }}</th>
              <th scope="col">{{ t('dischargeAir') }}</th>
              <th scope="col">{{ t('superheatBand') }}</th>
              <th scope="col">{{ t('coils') }}</th>
            </tr>
          </thead>
          <tbody>
            @for (fixture of specification().circuit.fixtures; track fixture.id) {
              <tr>
                <th scope="row">
                  {{ fixture.tag }} <span>{{ fixture.description }}</span>
                </th>
                <td>
                  {{ fixture.evaporatingTemperatureK | appQuantity: 'temperature' : units() }}
                  {{ t('basis_' + fixture.evaporatingBasis) }}
                </td>
                <td>{{ fixture.dischargeAirTemperatureK | appQuantity: 'temperature' : units() }}</td>
                <td>
                  {{ fixture.superheatLowK | appQuantity: 'temperatureDifference' : units() }} –
                  {{ fixture.superheatHighK | appQuantity: 'temperatureDifference' : units() }}
                </td>
                <td>{{ fixture.coils.length }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
    </details>
  `,
  styles: `
    summary {
      min-height: 32px;
      color: var(--app-frost);
      cursor: pointer;
    }
    .scroll {
      overflow-x: auto;
    }
    table {
      border-collapse: collapse;
      font-size: var(--app-size-1);
    }
    th,
    td {
      padding: var(--app-space-1) var(--app-space-4) var(--app-space-1) 0;
      border-bottom: 1px solid var(--app-rule-thin);
      text-align: left;
      white-space: nowrap;
    }
    td {
      font-family: var(--app-font-figures);
      font-variant-numeric: tabular-nums;
    }
    th span {
      color: var(--app-ink-soft);
      font-weight: 400;
    }
  `,
})
export class CircuitFacts {
  readonly sequence = input.required<SequenceDetail>();

  protected readonly specification = computed(() => this.sequence().specification);
  protected readonly units = computed(() => this.sequence().stepList.facts.unitSystem);
}
