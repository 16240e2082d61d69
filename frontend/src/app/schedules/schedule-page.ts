import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective, TranslocoService } from '@jsverse/transloco';
import type { OpeningId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { EmptyNote } from '../ui/notes/empty-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { countedKey } from '../ui/words/counted';
import { readingLanguage } from '../ui/words/reading-language';
import { exampleCsv, NEEDED_COLUMNS } from './schedule-example';
import { findProblems, type SaidProblem } from './schedule-file';
import { headingsInWords, reasonInWords, type Say } from './schedule-reason';
import { ScheduleUpload } from './schedule-upload';

const MANY_PROBLEMS = 20;

/** Takes the designer's schedule in: choose or drop a file, see what was read, import it, or see which rows are wrong. */
@Component({
  selector: 'app-schedule-page',
  imports: [EmptyNote, MatButton, OfflineNote, ProblemNote, RouterLink, TranslocoDirective],
  providers: [ScheduleUpload],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './schedule-page.html',
  styleUrl: './schedule-page.scss',
})
export class SchedulePage {
  readonly openingId = input.required<OpeningId>();

  private readonly session = inject(Session);
  protected readonly upload = inject(ScheduleUpload);
  protected readonly online = inject(Connectivity).online;

  protected readonly columns = NEEDED_COLUMNS;
  protected readonly parts = ['systems', 'suctionGroups', 'circuits', 'fixtures', 'coils'] as const;
  protected readonly mayImport = computed(() => this.session.may('schedule.import', this.openingId()));
  protected readonly isOver = signal(false);
  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  private readonly say = computed((): Say => {
    const language = this.language();
    return (key, parameters) => this.words.translate(key, parameters, language);
  });
  private readonly refused = computed(() => {
    const state = this.upload.state();
    return state.kind === 'refused' ? state.rows : [];
  });
  protected readonly problems = computed((): readonly SaidProblem[] =>
    this.refused().map(({ row, column, reason }) => ({
      row,
      column,
      reason: reasonInWords(reason, this.say(), this.language()),
    })),
  );
  protected readonly headings = computed(() =>
    headingsInWords(
      this.refused().map(({ reason }) => reason),
      this.say(),
    ),
  );
  /** Refrigerants that the program and the company have no table of; each once. */
  protected readonly unknownRefrigerants = computed((): readonly string[] => {
    if (!this.session.may('refrigerant.add')) return [];
    const texts = this.refused().flatMap(({ reason }) =>
      reason.code === 'unknownRefrigerant' ? [reason.params.text] : [],
    );
    return [...new Set(texts)];
  });
  protected readonly countedKey = countedKey;
  protected readonly isLong = computed(() => this.problems().length > MANY_PROBLEMS);
  /** A new refusal starts unfiltered. */
  protected readonly text = linkedSignal({ source: this.refused, computation: () => '' });
  protected readonly found = computed(() => findProblems(this.problems(), this.text()));
  protected readonly example = URL.createObjectURL(new Blob([exampleCsv()], { type: 'text/csv' }));

  constructor() {
    inject(DestroyRef).onDestroy(() => URL.revokeObjectURL(this.example));
  }

  protected choose(box: HTMLInputElement): void {
    const file = box.files?.[0];
    // So that the same file, corrected, can be chosen again.
    box.value = '';
    if (file) this.upload.check(this.openingId(), file);
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.isOver.set(false);
    const file = event.dataTransfer?.files[0];
    if (file) this.upload.check(this.openingId(), file);
  }

  protected over(event: DragEvent): void {
    event.preventDefault();
    this.isOver.set(true);
  }
}
