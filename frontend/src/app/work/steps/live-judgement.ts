import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Judgement } from '#shared/checklist/judgement';
import type { UnitSystem } from '#shared/units/unit-system';
import { judgedFigure } from '../../ui/answer-view/answer-figures';
import { OutcomeMark } from '../../ui/outcome-mark/outcome-mark';
import { Strip } from '../../ui/strip/strip';
import { JudgedOf } from '../../ui/words/judged-words';
import { WorkingSlip } from '../../ui/working-slip/working-slip';

/** How the answer stands while it is typed: mark, strip, what looks odd about it, and how it was worked out. */
@Component({
  selector: 'app-live-judgement',
  imports: [JudgedOf, OutcomeMark, Strip, WorkingSlip],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (judgement(); as judged) {
      @if (isRefused()) {
        @for (doubt of judged.doubts; track doubt.kind) {
          <p class="doubt">{{ doubt.kind | appJudged: 'doubt' }}</p>
        }
      } @else {
        @if (figure(); as figure) {
          <app-strip
            [label]="label()"
            [value]="figure.value"
            [low]="figure.low"
            [high]="figure.high"
            [minimum]="figure.minimum"
            [maximum]="figure.maximum"
            [uncertainty]="figure.uncertainty"
            [dimension]="figure.dimension"
            [unitSystem]="unitSystem()"
          />
        }
        @if (judged.outcome === 'within' || judged.outcome === 'outside') {
          <app-outcome-mark [outcome]="judged.outcome" [side]="judged.side" />
        }
        @for (verdict of judged.verdicts ?? []; track verdict) {
          <p class="verdict">{{ verdict | appJudged: 'verdict' }}</p>
        }
        @for (doubt of judged.doubts; track doubt.kind) {
          <p class="doubt ask">{{ doubt.kind | appJudged: 'doubt' }}</p>
        }
        @if (judged.working.length > 0) {
          <app-working-slip [working]="judged.working" [unitSystem]="unitSystem()" />
        }
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: var(--app-space-3);
    }
    .verdict {
      font-weight: 600;
    }
    .doubt {
      padding-left: var(--app-space-3);
      border-left: 6px solid var(--app-plum);
    }
    .ask {
      border-image: var(--app-hatch) 6;
    }
  `,
})
export class LiveJudgement {
  readonly judgement = input.required<Judgement | null>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly label = input.required<string>();

  protected readonly figure = computed(() => judgedFigure(this.judgement()));
  protected readonly isRefused = computed(
    () => this.judgement()?.doubts.some((doubt) => doubt.severity === 'refuse') ?? false,
  );
}
