import { LiveAnnouncer } from '@angular/cdk/a11y';
import { CdkStepperModule } from '@angular/cdk/stepper';
import { NgComponentOutlet } from '@angular/common';
import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChild,
  type ElementRef,
  type OnInit,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import type { StepView } from '#shared/sequences/sequence-view';
import { photosOf } from '../../offline/append-entry';
import type { OutboxEntry } from '../../offline/local-database';
import { Session } from '../../session/session';
import { AnswerView } from '../../ui/answer-view/answer-view';
import { CautionNote } from '../../ui/caution/caution-note';
import { DateTimeOf } from '../../ui/date-time-of';
import { TextOf } from '../../ui/text-of';
import { STEP_COMPONENTS } from '../steps/step-components';
import { StepDraft } from '../steps/step-draft';
import { isUnsent } from './local-view';
import { LocalPhotos } from './local-photos';
import { NotApplicable } from './not-applicable';
import { PhotoViewer } from './photo-viewer';
import { SequenceStore } from './sequence-store';
import { actionKey, showsRecorded, startingAnswer } from './step-action';
import { StepHistory } from './step-history';

/** One step on one screen: what to do, what is dangerous about it, the answer, and one action in the thumb's reach. */
@Component({
  selector: 'app-step-sheet',
  imports: [
    AnswerView,
    CautionNote,
    CdkStepperModule,
    DateTimeOf,
    MatButtonModule,
    MatIconModule,
    NgComponentOutlet,
    NotApplicable,
    PhotoViewer,
    StepHistory,
    TextOf,
    TranslocoPipe,
  ],
  providers: [StepDraft],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './step-sheet.html',
  styleUrl: './step-sheet.scss',
})
export class StepSheet implements OnInit {
  readonly view = input.required<StepView>();
  readonly detail = input.required<SequenceDetail>();
  readonly number = input.required<number>();
  readonly count = input.required<number>();
  /** Whether nothing may be recorded here any more, because the sequence is approved. */
  readonly isClosed = input(false);
  readonly refused = input<readonly OutboxEntry[]>([]);
  /** The step is done: the page decides what comes next. */
  readonly goOn = output<void>();
  readonly goToReview = output<void>();

  private readonly store = inject(SequenceStore);
  private readonly photos = inject(LocalPhotos);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly words = inject(TranslocoService);
  private readonly me = inject(Session).me;
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');
  protected readonly draft = inject(StepDraft);
  protected readonly isCorrecting = signal(false);
  protected readonly isBusy = signal(false);
  protected readonly failure = signal<string | null>(null);
  /** Goes up when the step is asked anew, so that its component starts afresh. */
  protected readonly round = signal(0);
  protected readonly photoOpen = signal<string | null>(null);

  protected readonly step = computed(() => this.view().step);
  protected readonly section = computed(() =>
    this.detail().stepList.sections.find((section) => section.key === this.step().section),
  );
  protected readonly isShown = computed(
    () => this.isClosed() || showsRecorded(this.view(), this.isCorrecting()),
  );
  protected readonly component = computed(() => STEP_COMPONENTS[this.step().kind]);
  protected readonly isLocal = computed(() => {
    const { current } = this.view();
    return !!current && isUnsent(current);
  });
  protected readonly photoUrl = computed(() => {
    const awaited = this.detail().photos.filter((photo) => photo.state === 'awaited');
    return this.photos.urlFor(this.detail().id, new Set(awaited.map((photo) => photo.sha256)));
  });
  protected readonly hasQuestion = computed(
    () => this.draft.refusals().length === 0 && (this.draft.judgement()?.doubts.length ?? 0) > 0,
  );
  protected readonly canRecord = computed(
    () => this.draft.answer() !== null && this.draft.refusals().length === 0,
  );
  protected readonly action = computed(() => actionKey(this.view(), this.hasQuestion()));
  protected readonly unitSystem = computed(() => this.detail().stepList.facts.unitSystem);

  constructor() {
    afterNextRender(() => this.heading().nativeElement.focus({ preventScroll: true }));
    effect(() => {
      const { id } = this.detail();
      const view = this.view();
      untracked(() => void this.photos.show(id, view));
    });
  }

  ngOnInit(): void {
    this.openDraft();
  }

  protected correct(): void {
    this.openDraft();
    this.isCorrecting.set(true);
  }

  protected async record(): Promise<void> {
    const answer = this.draft.answer();
    const judgement = this.draft.judgement();
    if (answer && judgement) await this.keep(() => this.store.record(this.view(), answer, judgement));
  }

  protected async recordNotApplicable(reason: string): Promise<void> {
    await this.keep(() => this.store.recordNotApplicable(this.view(), reason));
  }

  protected openPhoto(entry: FoldEntry, index: number): void {
    const sha256 = photosOf(entry.body.content)[index];
    if (sha256) this.photoOpen.set(this.photoUrl()(sha256, 'full'));
  }

  protected retry(entry: OutboxEntry): Promise<void> {
    return this.store.retry(entry);
  }

  protected nameOf(entry: FoldEntry): string {
    return this.store.nameOf(entry.body.authorId);
  }

  private async keep(store: () => Promise<void>): Promise<void> {
    if (this.isBusy()) return;
    this.isBusy.set(true);
    this.failure.set(null);
    try {
      await store();
      this.draft.forget();
      this.isCorrecting.set(false);
      void this.announcer.announce(this.words.translate('work.announceRecorded'));
      // An override that was set leaves the step open, and so does an answer that doesn't count: stay and show it.
      // The store has it already; this sheet's own input follows with the next rendering.
      const now = this.store.view()?.steps.find((view) => view.step.key === this.step().key);
      if (now && showsRecorded(now, false)) this.goOn.emit();
      else this.openDraft(now);
    } catch (error) {
      this.failure.set(failureKey(error));
    } finally {
      this.isBusy.set(false);
    }
  }

  private openDraft(view: StepView = this.view()): void {
    const { id, stepList } = this.detail();
    this.draft.open({
      sequenceId: id,
      step: this.step(),
      facts: stepList.facts,
      previous: startingAnswer(view),
      personName: this.me()?.name ?? '',
    });
    this.round.update((round) => round + 1);
  }
}

/** Why recording itself failed, which only the phone can cause. */
function failureKey(error: unknown): string {
  if (error instanceof DOMException && error.name === 'QuotaExceededError') return 'work.phoneFull';
  if (error instanceof Error && error.name === 'DomainFailure') return 'work.phoneUnknown';
  return 'work.couldNotStore';
}
