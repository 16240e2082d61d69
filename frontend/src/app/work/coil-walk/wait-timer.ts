import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { countdownText } from './clock-text';
import type { ValveWait } from './valve-wait';

/** The wait since the last turn of one valve: what is left of it, or that it may be read. */
@Component({
  selector: 'app-wait-timer',
  imports: [TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <p role="timer" aria-live="off" [class.over]="wait().isOver">
      @if (wait().isOver) {
        {{ 'work.waitOver' | transloco }}
      } @else {
        {{ 'work.waitLeft' | transloco }} <strong class="figures">{{ left() }}</strong>
      }
    </p>
  `,
  styles: `
    :host {
      display: block;
    }
    p {
      display: flex;
      align-items: baseline;
      gap: var(--app-space-2);
      padding: var(--app-space-1) var(--app-space-3);
      border-left: 8px solid;
      border-image: var(--app-hatch) 8;
    }
    strong {
      font-size: var(--app-size-4);
      font-weight: 500;
    }
    .over {
      border-image: none;
      border-left-color: var(--app-copper-line);
      font-weight: 600;
    }
  `,
})
export class WaitTimer {
  readonly wait = input.required<ValveWait>();

  protected readonly left = computed(() => countdownText(this.wait().remainingS));
}
