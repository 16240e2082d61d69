import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { StepDraft } from './step-draft';

/** Something to look at and find so: nothing to type, the sheet's action says it all. */
@Component({
  selector: 'app-confirm-step',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `<p>{{ 'work.confirmHint' | transloco }}</p>`,
  styles: 'p { color: var(--app-ink-soft); font-size: var(--app-size-1); }',
})
export class ConfirmStep {
  constructor() {
    inject(StepDraft).propose({ kind: 'confirm', confirmed: true });
  }
}
