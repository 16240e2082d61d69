import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { displayUnit } from '#shared/units/unit-system';
import { TextOf } from '../../ui/text-of';
import { LiveJudgement } from './live-judgement';
import { QuantityBox } from './quantity-box';
import { StepDraft } from './step-draft';
import { typedOrNull } from './typed-text';
import { WantedLimits } from './wanted-limits';

/** One value, judged while it is typed. */
@Component({
  selector: 'app-reading-step',
  imports: [LiveJudgement, QuantityBox, TextOf, TranslocoPipe, WantedLimits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <app-wanted-limits
      [low]="step.limits.low"
      [high]="step.limits.high"
      [dimension]="step.dimension"
      [unitSystem]="draft.unitSystem"
    />
    <app-quantity-box
      size="large"
      describedBy="reading-judged"
      [label]="'work.reading' | transloco"
      [dimension]="step.dimension"
      [unitSystem]="draft.unitSystem"
      [text]="typed().text"
      (textChange)="typed.set({ text: $event })"
    />
    <app-live-judgement
      id="reading-judged"
      [judgement]="draft.judgement()"
      [unitSystem]="draft.unitSystem"
      [label]="step.title | appText"
    />
  `,
  styles: ':host { display: grid; grid-template-columns: minmax(0, 1fr); gap: var(--app-space-3); }',
})
export class ReadingStep {
  protected readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('reading');
  protected readonly typed = this.draft.form({ text: this.draft.previousOf('reading')?.value.text ?? '' });

  constructor() {
    effect(() => {
      const unit = displayUnit(this.step.dimension, this.draft.unitSystem);
      const value = typedOrNull(this.typed().text, unit);
      this.draft.propose(value && { kind: 'reading', value }, 'reading');
    });
  }
}
