import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { drawJoint, type JointSize, type JointState } from './joint-drawing';

/** One joint of the copper line, drawn. Carries no words: whoever shows it says the state beside it. */
@Component({
  selector: 'app-joint-figure',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let d = drawing();
    <svg
      [attr.width]="d.width"
      [attr.height]="d.height"
      [attr.viewBox]="'0 0 ' + d.width + ' ' + d.height"
      aria-hidden="true"
      focusable="false"
    >
      <path class="pipe" [class.reached]="d.reached" [attr.d]="d.pipe" [attr.stroke-width]="d.pipeWidth" />
      @if (d.ring; as ring) {
        <circle [attr.cx]="ring.cx" [attr.cy]="ring.cy" [attr.r]="ring.r" [class.reached]="d.reached" />
      }
      <path class="fill" [attr.d]="d.fill" />
      <path class="collar" [attr.d]="d.collar" [attr.stroke-width]="d.collarWidth" />
      <path class="flag" [attr.d]="d.flag" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
    }
    svg {
      display: block;
      overflow: visible;
    }
    .pipe {
      fill: none;
      stroke: var(--app-rule);
      stroke-opacity: 0.55;
    }
    .pipe.reached {
      stroke: var(--app-copper-line);
      stroke-opacity: 1;
    }
    :host(.sent-back) .pipe {
      stroke: var(--app-plum);
    }
    :host(.no-sequence) .pipe {
      stroke-dasharray: 2 3;
    }
    circle {
      fill: var(--app-sheet);
      stroke: var(--app-rule);
      stroke-width: 2;
    }
    circle.reached {
      stroke: var(--app-copper-line);
    }
    .fill {
      fill: var(--app-copper-line);
    }
    .collar {
      fill: none;
      stroke: var(--app-copper);
      stroke-linecap: round;
    }
    .flag {
      fill: var(--app-copper);
      stroke: var(--app-copper);
      stroke-width: 1.5;
      stroke-linejoin: round;
    }
  `,
  host: {
    '[class.sent-back]': "state() === 'sentBack'",
    '[class.no-sequence]': "state() === 'noSequence'",
  },
})
export class JointFigure {
  readonly state = input.required<JointState>();
  readonly size = input<JointSize>('medium');

  protected readonly drawing = computed(() => drawJoint(this.state(), this.size()));
}
