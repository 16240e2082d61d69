import { LiveAnnouncer } from '@angular/cdk/a11y';
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
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import type { Answer } from '#shared/checklist/step';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import type { StepView } from '#shared/sequences/sequence-view';
import { photosOf } from '../../offline/append-entry';
import type { OutboxEntry } from '../../offline/local-database';
import { Session } from '../../session/session';
import { AnswerView } from '../../ui/answer-view/answer-view';
import { FloodLink } from '../../ui/flood-link/flood-link';
import { TextOf } from '../../ui/text-of';
import { readingLanguage } from '../../ui/words/reading-language';
import { SourceOf } from '../../ui/words/source-of';
import { STEP_COMPONENTS } from '../steps/step-components';
import { StepDraft } from '../steps/step-draft';
import { EntryStamp } from './entry-stamp';
import { arrivedPhotos, LocalPhotos } from './local-photos';
import { NotApplicable } from './not-applicable';
import { outsideValue } from './outside-value';
import { PhotoViewer } from './photo-viewer';
import { photosElsewhere } from './photos-elsewhere';
import { RecordPause } from './record-pause';
import { failureKey, whyNot } from './record-problem';
import { refusalWords } from './refusal-words';
import { SequenceStore } from './sequence-store';
import { actionKey, secondLook, sheetMode, startingAnswer } from './step-action';
import { StepFooter } from './step-footer';
import { StepGuidance } from './step-guidance';
import { StepHistory } from './step-history';

/** One step on one screen: what to do, what is dangerous about it, the answer, and one action in the thumb's reach. */
@Component({
  selector: 'app-step-sheet',
  imports: [
    AnswerView,
    EntryStamp,
    FloodLink,
    MatIconModule,
    NgComponentOutlet,
    NotApplicable,
    PhotoViewer,
    SourceOf,
    StepFooter,
    StepGuidance,
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
  /** What was recorded here and the server doesn't take. */
  readonly troubled = input<readonly OutboxEntry[]>([]);
  /** Overrides that stand anywhere on the circuit: nobody signs before they are put back. */
  readonly standing = input<readonly StepView[]>([]);
  /** The step is done: the page decides what comes next. */
  readonly goOn = output<void>();
  readonly goToReview = output<void>();

  private readonly store = inject(SequenceStore);
  private readonly photos = inject(LocalPhotos);
  protected readonly refusalWords = refusalWords;
  private readonly pause = inject(RecordPause);
  private readonly language = readingLanguage();
  private readonly announcer = inject(LiveAnnouncer);
  private readonly words = inject(TranslocoService);
  private readonly me = inject(Session).me;
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');
  protected readonly draft = inject(StepDraft);
  protected readonly isCorrecting = signal(false);
  protected readonly isNotApplicableOpen = signal(false);
  /** The answer about which the second look was asked for: the next tap records it. */
  private readonly lookedAt = signal<Answer | null>(null);
  protected readonly isBusy = signal(false);
  protected readonly failure = signal<string | null>(null);
  /** Goes up when the step is asked anew, so that its component starts afresh. */
  protected readonly round = signal(0);
  protected readonly photoOpen = signal<string | null>(null);

  protected readonly step = computed(() => this.view().step);
  protected readonly section = computed(() =>
    this.detail().stepList.sections.find((section) => section.key === this.step().section),
  );
  protected readonly mode = computed(() => sheetMode(this.view(), this.isCorrecting(), this.isClosed()));
  protected readonly component = computed(() => STEP_COMPONENTS[this.step().kind]);
  protected readonly photoUrl = computed(() =>
    this.photos.urlFor(this.detail().id, arrivedPhotos(this.detail().photos)),
  );
  private readonly look = computed(() =>
    secondLook(this.step().kind, this.draft.judgement(), this.draft.isUnsettled()),
  );
  /** Key of the question that the next tap answers with yes; `null` until the first tap, and after any change. */
  protected readonly question = computed(() => {
    const look = this.look();
    return look && this.lookedAt() === this.draft.answer() ? `work.secondLook_${look}` : null;
  });
  protected readonly outside = computed(() =>
    outsideValue(this.draft.answer(), this.draft.judgement(), this.unitSystem(), this.language()),
  );
  protected readonly reason = computed(() =>
    this.mode() === 'ask' ? whyNot(this.step().kind, this.draft, this.standing(), this.language()) : null,
  );
  protected readonly canAct = computed(
    () => !this.isBusy() && this.reason() === null && (this.mode() !== 'ask' || this.draft.answer() !== null),
  );
  /** The box for "does not apply" brings its own button: a grey one beside it would only puzzle. */
  protected readonly hasMain = computed(() => !this.isNotApplicableOpen() || this.canAct());
  protected readonly action = computed(() =>
    actionKey(this.step().kind, this.mode(), this.question() !== null),
  );
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

  protected act(): void {
    if (this.pause.isOn) return;
    if (this.mode() !== 'ask') this.goOn.emit();
    else if (this.look() && this.question() === null) {
      this.lookedAt.set(this.draft.answer());
      this.pause.begin();
    } else void this.record();
  }

  private async record(): Promise<void> {
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
    if (this.isBusy() || this.pause.isOn) return;
    this.isBusy.set(true);
    this.pause.begin();
    this.failure.set(null);
    try {
      await store();
      this.draft.forget();
      this.isCorrecting.set(false);
      void this.announcer.announce(this.words.translate('work.announceRecorded'));
      this.isNotApplicableOpen.set(false);
      // An answer that doesn't count leaves the step open: stay and show it.
      // The store has it already; this sheet's own input follows with the next rendering.
      const now = this.store.view()?.steps.find((view) => view.step.key === this.step().key);
      this.openDraft(now);
      if (now && sheetMode(now, false, false) !== 'ask') this.goOn.emit();
    } catch (error) {
      this.failure.set(failureKey(error));
    } finally {
      this.isBusy.set(false);
    }
  }

  private openDraft(view: StepView = this.view()): void {
    const { id, stepList, photos } = this.detail();
    const whole = this.store.view();
    this.draft.open({
      sequenceId: id,
      step: this.step(),
      facts: stepList.facts,
      previous: startingAnswer(view),
      isStanding: sheetMode(view, this.isCorrecting(), false) === 'standing',
      record: () => void this.record(),
      personName: this.me()?.name ?? '',
      arrivedPhotos: arrivedPhotos(photos),
      view,
      whole,
      photosElsewhere: whole ? photosElsewhere(whole, this.step().key) : new Map(),
    });
    this.round.update((round) => round + 1);
  }
}
