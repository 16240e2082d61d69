import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { OutcomeMark } from '../../ui/outcome-mark/outcome-mark';
import { TextOf } from '../../ui/text-of';
import { StepDraft } from './step-draft';

/** One of a few findings, each a row that a thumb in a glove can hit. */
@Component({
  selector: 'app-choose-step',
  imports: [OutcomeMark, TextOf],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <fieldset>
      <legend class="heard-only">{{ step.title | appText }}</legend>
      @for (option of step.options; track option.value) {
        <label>
          <input
            type="radio"
            name="choose"
            [value]="option.value"
            [checked]="typed().value === option.value"
            (change)="typed.set({ value: option.value })"
          />
          <span>{{ option.label | appText }}</span>
          @if (typed().value === option.value && option.outcome !== 'recorded') {
            <app-outcome-mark [outcome]="option.outcome" />
          }
        </label>
      }
    </fieldset>
  `,
  styleUrl: './choose-step.scss',
})
export class ChooseStep {
  private readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('choose');
  protected readonly typed = this.draft.form({ value: this.draft.previousOf('choose')?.value ?? '' });

  constructor() {
    effect(() => {
      const { value } = this.typed();
      this.draft.propose(value === '' ? null : { kind: 'choose', value }, 'choice');
    });
  }
}
