import { ChangeDetectionStrategy, Component, computed, model } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { SUPERHEAT_CONDITIONS, type SuperheatCondition } from '#shared/checklist/kinds/superheat';

/** What has to be so for a superheat to mean anything: one line, five rows to tick when it is opened. */
@Component({
  selector: 'app-superheat-conditions',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <details>
      <summary>
        <span>{{ 'work.conditions' | transloco }}:</span>&ngsp;
        @if (areMet()) {
          <span class="state">{{ 'work.conditionsMet' | transloco }}</span>
        } @else {
          <span class="lacking">{{
            'work.conditionsCount' | transloco: { count: met().length, of: all.length }
          }}</span>
        }
      </summary>
      <fieldset class="checks">
        <legend class="heard-only">{{ 'work.conditions' | transloco }}</legend>
        @for (one of all; track one) {
          <label>
            <input type="checkbox" [checked]="met().includes(one)" (change)="toggle(one)" />
            <span>{{ 'work.condition_' + one | transloco }}</span>
          </label>
        }
      </fieldset>
    </details>
    @if (!areMet()) {
      <p class="hatched">{{ 'work.preliminary' | transloco }}</p>
    }
  `,
  styleUrl: './superheat-rows.scss',
  styles: `
    fieldset {
      min-width: 0;
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
    }
  `,
})
export class SuperheatConditions {
  readonly met = model.required<readonly SuperheatCondition[]>();

  protected readonly all = SUPERHEAT_CONDITIONS;
  protected readonly areMet = computed(() => this.all.every((one) => this.met().includes(one)));

  protected toggle(one: SuperheatCondition): void {
    const met = this.met();
    // In their own order, whatever was tapped first: the same conditions make the same entry.
    this.met.set(this.all.filter((condition) => (condition === one) !== met.includes(condition)));
  }
}
