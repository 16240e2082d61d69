import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { StateMark } from '../../ui/state-mark/state-mark';
import type { WorkRow } from './circuit-groups';

/** One circuit of the day: its code as people call it across a store, what it is, how far it has come. */
@Component({
  selector: 'app-circuit-row',
  imports: [MatIconModule, RouterLink, StateMark, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './circuit-row.html',
  styleUrl: './circuit-row.scss',
})
export class CircuitRowLine {
  readonly row = input.required<WorkRow>();
  /** Whether it says which opening it belongs to, where circuits of several stand together. */
  readonly withOpening = input(false);
  /** Kept rows from before there was such work have no level. */
  protected readonly isLevelWork = computed(() => ['system', 'suctionGroup'].includes(this.row().level));
  /** How much of the line is brazed, from 0 to 100. */
  protected readonly reached = computed(() => {
    const { stepsDone, stepsTotal } = this.row();
    return stepsTotal === 0 ? 0 : (100 * stepsDone) / stepsTotal;
  });
}
