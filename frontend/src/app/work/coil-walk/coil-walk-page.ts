import { LiveAnnouncer } from '@angular/cdk/a11y';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import type { SequenceId } from '#shared/plant/ids';
import { Connectivity } from '../../offline/connectivity';
import { PageTitles } from '../../shell/page-titles';
import { DateTimeOf } from '../../ui/date-time-of';
import { EmptyNote } from '../../ui/notes/empty-note';
import { LoadingNote } from '../../ui/notes/loading-note';
import { ProblemNote } from '../../ui/notes/problem-note';
import { readingLanguage } from '../../ui/words/reading-language';
import { SequenceStore } from '../sequence/sequence-store';
import { DraftKeeper } from '../steps/draft-keeper';
import { CoilLineRow } from './coil-line-row';
import { coilLine, type CoilRow } from './coil-rows';
import { ticking } from './phone-clock';

/**
 * The coils of one circuit as they stand in the line-up, for a walk from valve to valve: each is one tap away, and the
 * waits of several run at once. Reads this phone only, so that it works without a network.
 */
@Component({
  selector: 'app-coil-walk-page',
  imports: [
    CoilLineRow,
    DateTimeOf,
    EmptyNote,
    LoadingNote,
    MatIconModule,
    ProblemNote,
    RouterLink,
    TranslocoPipe,
  ],
  providers: [SequenceStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './coil-walk-page.html',
  styleUrl: './coil-walk-page.scss',
})
export class CoilWalkPage {
  readonly sequenceId = input.required<SequenceId>();

  private readonly drafts = inject(DraftKeeper);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly titles = inject(PageTitles);
  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  private readonly now = ticking();
  protected readonly store = inject(SequenceStore);
  protected readonly online = inject(Connectivity).online;
  protected readonly detail = this.store.detail;
  /** Read once for all that stands on the page: nothing is typed while it is open. */
  private readonly kept = computed(() => {
    const id = this.sequenceId();
    const steps = this.detail()?.stepList.steps ?? [];
    return new Map(
      steps.filter(({ kind }) => kind === 'superheat').map(({ key }) => [key, this.drafts.read(id, key)]),
    );
  });
  protected readonly line = computed(() => {
    const view = this.store.view();
    const detail = this.detail();
    return view && detail ? coilLine(view, detail, (key) => this.kept().get(key), this.now()) : [];
  });
  private readonly rows = computed(() => this.line().flatMap(({ rows }) => rows));
  protected readonly count = computed(() => this.rows().length);
  protected readonly done = computed(() => this.rows().filter(({ state }) => state === 'done').length);
  protected readonly unitSystem = computed(() => this.detail()?.stepList.facts.unitSystem ?? 'us');
  private settled: ReadonlySet<string> | null = null;

  constructor() {
    effect(() => {
      const id = this.sequenceId();
      untracked(() => void this.store.open(id));
    });
    effect(() => {
      const code = this.detail()?.specification.circuit.code;
      if (code) this.titles.set(`${code} · ${this.words.translate('work.coilWalk', {}, this.language())}`);
    });
    effect(() => {
      const rows = this.rows();
      if (rows.length > 0) this.tellSettled(rows);
    });
  }

  /** Says which wait has ended since the last look; what was over when the page opened is only shown. */
  private tellSettled(rows: readonly CoilRow[]): void {
    const over = rows.filter(({ state }) => state === 'settled');
    const before = this.settled;
    this.settled = new Set(over.map(({ stepKey }) => stepKey));
    if (before === null) return;
    for (const row of over.filter(({ stepKey }) => !before.has(stepKey))) {
      const coil = row.title[this.language()];
      void this.announcer.announce(this.words.translate('work.coilSettled', { coil }, this.language()));
    }
  }
}
