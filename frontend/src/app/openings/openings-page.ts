import { ChangeDetectionStrategy, Component, computed, inject, resource } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { auditTime } from 'rxjs';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { CopperLine } from '../ui/copper-line/copper-line';
import { DateOf } from '../ui/date-of';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { DaysLeft } from '../ui/pages/days-left';
import { lastRead } from '../ui/pages/last-read';
import { countedKey } from '../ui/words/counted';
import { dayOf } from '../ui/words/dates';
import { circuitTotal, lineOfCounts, stateCounts } from './opening-counts';
import { orderOpenings } from './opening-order';
import { OpeningsApi } from './openings-api';

/** The ledger of openings: one ruled row each, the soonest on top, with how far its circuits are. */
@Component({
  selector: 'app-openings-page',
  imports: [
    CopperLine,
    DateOf,
    DaysLeft,
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    ProblemNote,
    RouterLink,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './openings-page.html',
  styleUrl: './openings-page.scss',
})
export class OpeningsPage {
  private readonly api = inject(OpeningsApi);
  private readonly session = inject(Session);
  protected readonly online = inject(Connectivity).online;
  protected readonly countedKey = countedKey;

  protected readonly list = resource({ loader: () => this.api.openings() });
  protected readonly read = lastRead(this.list);
  protected readonly mayCreate = computed(() => this.session.may('opening.create'));
  protected readonly rows = computed(() =>
    orderOpenings(this.read()?.items ?? [], dayOf(new Date())).map((opening) => ({
      opening,
      line: lineOfCounts(opening.counts),
      counts: stateCounts(opening.counts),
      total: circuitTotal(opening.counts),
    })),
  );

  constructor() {
    inject(LiveEvents)
      .on('sequenceChanged')
      .pipe(auditTime(3000), takeUntilDestroyed())
      .subscribe(() => this.list.reload());
  }
}
