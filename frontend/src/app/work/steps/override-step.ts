import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { TextOf } from '../../ui/text-of';
import { StepDraft } from './step-draft';

/**
 * Something set by hand, later put back. The step stays open in between, and the circuit with it. Setting is the sheet's
 * action; putting back is a button in here, in another place, so that no second tap undoes the first.
 */
@Component({
  selector: 'app-override-step',
  imports: [TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (isStanding) {
      <p class="standing">
        <strong>{{ 'work.stillSet' | transloco: { subject: (step.subject | appText) } }}</strong>
        {{ 'work.overrideStands' | transloco }}
      </p>
    } @else {
      <p class="subject">{{ step.subject | appText }}</p>
      <p>{{ 'work.overrideSetHint' | transloco }}</p>
    }
    <label>
      <span>{{ 'work.remarkIfAny' | transloco }}</span>
      <textarea rows="2" maxlength="500" [value]="typed().remark" (input)="take($event)"></textarea>
    </label>
    @if (isStanding) {
      <button type="button" (click)="putBack()">{{ 'work.putBack' | transloco }}</button>
    }
  `,
  styleUrl: './words-box.scss',
})
export class OverrideStep {
  private readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('override');
  protected readonly isStanding = this.draft.current.isStanding;
  protected readonly typed = this.draft.form({ remark: '' });

  constructor() {
    const phase = this.isStanding ? 'putBack' : 'set';
    effect(() => this.draft.propose({ kind: 'override', phase, remark: this.typed().remark.trim() }));
  }

  protected putBack(): void {
    this.draft.current.record();
  }

  protected take(event: Event): void {
    this.typed.set({ remark: (event.target as HTMLTextAreaElement).value });
  }
}
