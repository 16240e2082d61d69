import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { Connectivity } from '../../offline/connectivity';
import { LocalDatabase } from '../../offline/local-database';
import { Outbox } from '../../offline/outbox';
import { DateTimeOf } from '../../ui/date-time-of';
import { EmptyNote } from '../../ui/notes/empty-note';
import { LoadingNote } from '../../ui/notes/loading-note';
import { ProblemNote } from '../../ui/notes/problem-note';
import { WaitingValves } from '../coil-walk/waiting-valves';
import { CircuitRowLine } from './circuit-row';
import { MyCircuitsStore } from './my-circuits-store';

/** The day's work: what was sent back first, then area by area through the store. */
@Component({
  selector: 'app-circuits-page',
  imports: [CircuitRowLine, DateTimeOf, EmptyNote, LoadingNote, ProblemNote, TranslocoPipe, WaitingValves],
  providers: [MyCircuitsStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './circuits-page.html',
  styleUrl: './circuits-page.scss',
})
export class CircuitsPage {
  protected readonly store = inject(MyCircuitsStore);
  protected readonly outbox = inject(Outbox);
  protected readonly online = inject(Connectivity).online;
  protected readonly database = inject(LocalDatabase);

  constructor() {
    void this.store.open();
  }
}
