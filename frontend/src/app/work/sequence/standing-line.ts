import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { StepView } from '#shared/sequences/sequence-view';
import { TextOf } from '../../ui/text-of';

/** What is set by hand and has to be put back, in sight on every other step: a thin line that leads there. */
@Component({
  selector: 'app-standing-line',
  imports: [TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @for (view of standing(); track view.step.key) {
      @if (view.step.kind === 'override') {
        <button type="button" (click)="pick.emit(view.step.key)">
          {{ 'work.stillSet' | transloco: { subject: (view.step.subject | appText) } }}
        </button>
      }
    }
  `,
  styles: `
    :host {
      display: block;
    }
    button {
      display: block;
      width: 100%;
      min-height: 36px;
      margin-top: var(--app-space-2);
      padding: var(--app-space-1) var(--app-space-3);
      background: none;
      border: 0;
      border-left: 8px solid;
      border-image: var(--app-hatch) 8;
      color: var(--app-ochre);
      font-size: var(--app-size-1);
      font-weight: 600;
      text-align: left;
      text-decoration: underline;
      text-underline-offset: 0.2em;
      cursor: pointer;
    }
  `,
})
export class StandingLine {
  readonly standing = input.required<readonly StepView[]>();
  /** Key of the override's step. */
  readonly pick = output<string>();
}
