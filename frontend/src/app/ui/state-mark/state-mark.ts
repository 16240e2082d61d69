import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { JointState } from '../joint/joint-drawing';
import { JointFigure } from '../joint/joint-figure';

/** Where a circuit's sequence stands: its joint and the word for it. Without the word it is still read aloud. */
@Component({
  selector: 'app-state-mark',
  imports: [TranslocoDirective, JointFigure],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'ui'">
      <app-joint-figure [state]="state()" size="medium" />
      <span [class.heard-only]="!withWord()">{{ t('state_' + state()) }}</span>
    </ng-container>
  `,
  styles: `
    :host {
      position: relative;
      display: inline-flex;
      align-items: center;
      gap: var(--app-space-2);
      vertical-align: middle;
      white-space: nowrap;
    }
  `,
})
export class StateMark {
  readonly state = input.required<JointState>();
  readonly withWord = input(true);
}
