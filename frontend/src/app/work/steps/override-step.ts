import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { TextOf } from '../../ui/text-of';
import { StepDraft } from './step-draft';

/** Something put by hand: first set, later put back. The step stays open in between, and the circuit with it. */
@Component({
  selector: 'app-override-step',
  imports: [TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p class="subject">{{ step.subject | appText }}</p>
    @if (phase === 'putBack') {
      <p class="standing">{{ 'work.overrideStands' | transloco }}</p>
    } @else {
      <p>{{ 'work.overrideSetHint' | transloco }}</p>
    }
    <label>
      <span>{{ 'work.remarkIfAny' | transloco }}</span>
      <textarea rows="2" maxlength="500" [value]="typed().remark" (input)="take($event)"></textarea>
    </label>
  `,
  styleUrl: './words-box.scss',
})
export class OverrideStep {
  private readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('override');
  protected readonly phase = this.draft.previousOf('override')?.phase === 'set' ? 'putBack' : 'set';
  protected readonly typed = this.draft.form({ remark: '' });

  constructor() {
    effect(() =>
      this.draft.propose({ kind: 'override', phase: this.phase, remark: this.typed().remark.trim() }),
    );
  }

  protected take(event: Event): void {
    this.typed.set({ remark: (event.target as HTMLTextAreaElement).value });
  }
}
