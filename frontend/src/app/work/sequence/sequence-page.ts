import { CdkStepperModule } from '@angular/cdk/stepper';
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
import { Router, RouterLink } from '@angular/router';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import type { SequenceId } from '#shared/plant/ids';
import { Connectivity } from '../../offline/connectivity';
import { PageTitles } from '../../shell/page-titles';
import { DateTimeOf } from '../../ui/date-time-of';
import { LoadingNote } from '../../ui/notes/loading-note';
import { ProblemNote } from '../../ui/notes/problem-note';
import { StateMark } from '../../ui/state-mark/state-mark';
import { readingLanguage } from '../../ui/words/reading-language';
import { LocalPhotos } from './local-photos';
import { RecordPause } from './record-pause';
import { SequenceStore } from './sequence-store';
import { StandingLine } from './standing-line';
import { standingOverrides } from './step-action';
import { StepLine } from './step-line';
import { firstOpenStep, nextOpenStep } from './step-order';
import { StepOverview } from './step-overview';
import { StepRun } from './step-run';
import { StepSheet } from './step-sheet';
import { SubmitSheet } from './submit-sheet';

/** The two places of a sequence that aren't steps; step keys can't be these, they hold a colon or a dot. */
const OVERVIEW = 'overview';
const SUBMIT = 'submit';
/** End of the coil walk's address. */
const COILS = 'coils';

/** One circuit, step by step. `at` in the address says where, so that a reload or another day goes on there. */
@Component({
  selector: 'app-sequence-page',
  imports: [
    CdkStepperModule,
    DateTimeOf,
    LoadingNote,
    MatIconModule,
    ProblemNote,
    RouterLink,
    StandingLine,
    StateMark,
    StepLine,
    StepOverview,
    StepRun,
    StepSheet,
    SubmitSheet,
    TranslocoPipe,
  ],
  providers: [SequenceStore, LocalPhotos, RecordPause],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sequence-page.html',
  styleUrl: './sequence-page.scss',
})
export class SequencePage {
  readonly sequenceId = input.required<SequenceId>();
  readonly at = input<string>();
  /** `coils`: opened from the coil walk, which is gone back to when the coil is done. */
  readonly from = input<string>();

  private readonly router = inject(Router);
  private readonly titles = inject(PageTitles);
  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  protected readonly store = inject(SequenceStore);
  protected readonly online = inject(Connectivity).online;
  protected readonly view = this.store.view;
  protected readonly detail = this.store.detail;
  protected readonly level = computed(() => this.detail()?.specification.level ?? 'circuit');

  protected readonly place = computed<'step' | 'overview' | 'submit'>(() => {
    const at = this.at();
    // Until it is known where to go on, everything is one tap away.
    if (at === OVERVIEW || at === undefined) return 'overview';
    return at === SUBMIT || this.index() === -1 ? 'submit' : 'step';
  });
  protected readonly index = computed(
    () => this.view()?.steps.findIndex(({ step }) => step.key === this.at()) ?? -1,
  );
  /** Two coils and more are worked in turns, one's valve settling while another is read. */
  protected readonly hasCoilWalk = computed(
    () => (this.view()?.steps.filter(({ step }) => step.kind === 'superheat').length ?? 0) > 1,
  );
  protected readonly isAtCoil = computed(
    () => this.hasCoilWalk() && this.view()?.steps[this.index()]?.step.kind === 'superheat',
  );
  protected readonly up = computed(() =>
    this.from() === COILS ? ['/work', this.sequenceId(), COILS] : ['/work'],
  );
  protected readonly standing = computed(() => {
    const view = this.view();
    return view ? standingOverrides(view) : [];
  });
  protected readonly standingElsewhere = computed(() =>
    this.standing().filter((view) => view.step.key !== this.at()),
  );
  protected readonly state = computed(() => {
    const view = this.view();
    if (!view) return 'open';
    return view.fold.state === 'open' && Object.keys(view.fold.steps).length > 0
      ? 'underWay'
      : view.fold.state;
  });
  protected readonly isClosed = computed(() => this.view()?.fold.state === 'approved');
  protected readonly sentBackBy = computed(() => {
    const review = this.view()?.reviews.at(-1);
    // On the step that the lead asks for again, the remark itself says so.
    if (this.view()?.steps[this.index()]?.remark) return null;
    return this.state() === 'sentBack' && review ? this.store.nameOf(review.body.authorId) : null;
  });
  protected readonly remarkCount = computed(
    () => this.view()?.steps.filter(({ fold }) => fold && fold.reopenedBy !== null).length ?? 0,
  );

  /** The circuit's code, and where on it one is. */
  private readonly title = computed(() => {
    const circuit = this.detail()?.specification.circuit;
    if (!circuit) return null;
    const language = this.language();
    const step = this.view()?.steps[this.index()]?.step;
    if (step) return `${circuit.code} · ${this.index() + 1}. ${step.title[language]}`;
    const submit = this.words.translate<string>('work.reviewTitle', {}, language);
    const level = this.level();
    const what =
      level === 'circuit'
        ? circuit.description
        : this.words.translate<string>(`ui.level_${level}`, {}, language);
    return `${circuit.code} · ${this.place() === 'submit' ? submit : what}`;
  });

  constructor() {
    effect(() => {
      const id = this.sequenceId();
      // Only the address decides what is open; what opening reads on its way must not open it again.
      untracked(() => void this.store.open(id));
    });
    effect(() => {
      const title = this.title();
      if (title) this.titles.set(title);
    });
    effect(() => {
      const view = this.view();
      if (view && this.at() === undefined && this.store.isSettled())
        untracked(() => this.goTo(firstOpenStep(view) ?? SUBMIT));
    });
  }

  protected goTo(at: string): void {
    // Steps replace each other, so that the phone's back key leaves the circuit instead of walking all steps back.
    void this.router.navigate([], { queryParams: { at }, replaceUrl: at !== OVERVIEW });
  }

  protected goToIndex(index: number): void {
    const step = this.view()?.steps[index];
    if (step && index !== this.index()) this.goTo(step.step.key);
  }

  protected goOn(): void {
    if (this.from() === COILS) {
      void this.router.navigate(this.up(), { replaceUrl: true });
      return;
    }
    const view = this.view();
    const at = this.at();
    if (view && at) this.goTo(nextOpenStep(view, at) ?? SUBMIT);
  }

  protected toggleOverview(): void {
    const view = this.view();
    if (this.place() === 'overview' && view) this.goTo(firstOpenStep(view) ?? SUBMIT);
    else this.goTo(OVERVIEW);
  }

  protected lineLabel(): string {
    const circuit = this.detail()?.specification.circuit;
    return this.words.translate('work.stepsOf', { code: circuit?.code ?? '' });
  }

  protected troubledOn(stepKey: string) {
    return this.store
      .troubled()
      .filter(({ body: { content } }) => 'stepKey' in content && content.stepKey === stepKey);
  }
}
