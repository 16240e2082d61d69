import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, inject, input, resource } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective, TranslocoService } from '@jsverse/transloco';
import { auditTime } from 'rxjs';
import type { OpeningId } from '#shared/plant/ids';
import type { QueueItem } from '#shared/contracts/review-queue';
import { Connectivity } from '../offline/connectivity';
import { LiveEvents } from '../shell/live-events';
import { DateTimeOf } from '../ui/date-time-of';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { OutcomeMark } from '../ui/outcome-mark/outcome-mark';
import { DaysLeft } from '../ui/pages/days-left';
import { lastRead } from '../ui/pages/last-read';
import { countedKey } from '../ui/words/counted';
import { newSince, orderQueue } from './queue-order';
import { ReviewsApi } from './reviews-api';

/** All submitted circuits that wait for a lead: outside first, then the oldest. New ones come in without a reload. */
@Component({
  selector: 'app-queue-page',
  imports: [
    DateTimeOf,
    DaysLeft,
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    OutcomeMark,
    ProblemNote,
    RouterLink,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './queue-page.html',
  styleUrl: './queue-page.scss',
})
export class QueuePage {
  /** Only this opening's, when the address names one. */
  readonly opening = input<OpeningId>();

  private readonly api = inject(ReviewsApi);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly transloco = inject(TranslocoService);
  private known: readonly QueueItem[] | null = null;
  protected readonly online = inject(Connectivity).online;

  protected readonly countedKey = countedKey;
  protected readonly list = resource({
    params: () => this.opening() ?? null,
    loader: async ({ params }) => this.announce(await this.api.queue(params)),
  });
  protected readonly read = lastRead(this.list);
  protected readonly rows = computed(() => orderQueue(this.read()?.items ?? []));
  protected readonly openingName = computed(() =>
    this.opening() ? (this.rows()[0]?.openingName ?? null) : null,
  );

  constructor() {
    inject(LiveEvents)
      .on('sequenceChanged')
      .pipe(auditTime(800), takeUntilDestroyed())
      .subscribe(() => this.list.reload());
  }

  /** Tells a screen reader, when it is done with its sentence, that there is more to review. */
  private announce(read: Awaited<ReturnType<ReviewsApi['queue']>>): Awaited<ReturnType<ReviewsApi['queue']>> {
    const count = newSince(this.known, read.items);
    this.known = read.items;
    if (count > 0) {
      const sentence = this.transloco.translate<string>(countedKey('reviews.new', count), { count });
      void this.announcer.announce(sentence, 'polite');
    }
    return read;
  }
}
