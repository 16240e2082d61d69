import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import type { UnitSystem } from '#shared/units/unit-system';
import { QuantityOf } from '../../ui/quantity-of';
import { JudgedOf } from '../../ui/words/judged-words';
import { meansOf } from './means-of';

/** What a series or a log shows of its valve: both averages, the one that is judged by marked, and the swing. */
@Component({
  selector: 'app-superheat-means',
  imports: [JudgedOf, QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (lines().length > 0) {
      <dl class="lines">
        @for (line of lines(); track line.label) {
          <div [class.judged]="line.isJudged">
            <dt>
              {{ line.label | appJudged: 'figure' }}
              @if (line.isJudged) {
                <span class="mark">{{ 'work.judgedBy' | transloco }}</span>
              }
            </dt>
            &ngsp;
            <dd class="figures">{{ line.value | appQuantity: line.dimension : unitSystem() }}</dd>
          </div>
        }
      </dl>
    }
  `,
  styleUrl: './superheat-rows.scss',
  styles: `
    .judged {
      font-weight: 600;
    }
    .mark {
      margin-left: var(--app-space-2);
      color: var(--app-copper);
      font-size: var(--app-size-1);
      white-space: nowrap;
    }
  `,
})
export class SuperheatMeans {
  readonly judgement = input.required<Judgement | null>();
  readonly step = input.required<SuperheatStep>();
  readonly unitSystem = input.required<UnitSystem>();

  protected readonly lines = computed(() => meansOf(this.judgement(), this.step(), this.unitSystem()));
}
