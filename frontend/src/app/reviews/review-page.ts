import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { TranslocoDirective, TranslocoService } from '@jsverse/transloco';
import { auditTime, filter } from 'rxjs';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { unreachable } from '#shared/failures/unreachable';
import type { SequenceId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { PageTitles } from '../shell/page-titles';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { StateMark } from '../ui/state-mark/state-mark';
import { readingLanguage } from '../ui/words/reading-language';
import { CircuitFacts } from './circuit-facts';
import { OtherEntries } from './other-entries';
import { PhotoDialog, type PhotoSet } from './photo-dialog';
import { outsideSteps } from './outside-steps';
import { photosOf } from './photo-states';
import { ReviewFocus } from './review-focus';
import { REVIEW_KEYS, reviewAction, type ReviewAction } from './review-keys';
import { ReviewSteps } from './review-steps';
import { ReviewStore } from './review-store';
import { ReviewsApi } from './reviews-api';
import { StepEvidence } from './step-evidence';
import { VerdictPanel, type VerdictMode } from './verdict-panel';
import { VerdictSender } from './verdict-sender';

/**
 * One sequence under review: steps on the left, those that need eyes first; the evidence of the chosen one on the right;
 * the verdict below. Readable in every state; a verdict only on what is submitted, by somebody who recorded none of it.
 */
@Component({
  selector: 'app-review-page',
  imports: [
    CircuitFacts,
    EmptyNote,
    LoadingNote,
    OfflineNote,
    OtherEntries,
    ProblemNote,
    ReviewSteps,
    RouterLink,
    StateMark,
    StepEvidence,
    TranslocoDirective,
    VerdictPanel,
  ],
  providers: [ReviewFocus, ReviewStore, VerdictSender],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './review-page.html',
  styleUrl: './review-page.scss',
  host: { '(document:keydown)': 'press($event)' },
})
export class ReviewPage {
  readonly sequenceId = input.required<SequenceId>();
  /** Key of the step that the address names. */
  readonly step = input<string>();

  private readonly api = inject(ReviewsApi);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly document = inject(DOCUMENT);
  private readonly language = readingLanguage();
  private readonly focus = inject(ReviewFocus);
  private readonly titles = inject(PageTitles);
  private readonly words = inject(TranslocoService);
  private readonly evidence = viewChild(StepEvidence);
  private readonly session = inject(Session);
  protected readonly store = inject(ReviewStore);
  protected readonly sender = inject(VerdictSender);
  protected readonly online = inject(Connectivity).online;

  protected readonly printedName = computed(() => this.session.me()?.name ?? '');
  protected readonly item = computed(() => {
    const items = this.store.items();
    return items.find(({ view }) => view.step.key === this.step()) ?? items[0] ?? null;
  });
  /** As lists say it: what has a recording is under way. */
  protected readonly standing = computed(() => {
    const { fold } = this.store.sequence() ?? {};
    if (!fold) return 'open';
    return fold.state === 'open' && fold.headPosition > 1 ? 'underWay' : fold.state;
  });
  protected readonly isHelpOpen = signal(false);
  /** On a phone there is room for one: the list or the evidence. */
  protected readonly isListOpen = linkedSignal({ source: this.sequenceId, computation: () => true });
  /** What an approval covers although it lies outside. */
  protected readonly outside = computed(() => {
    const view = this.store.view();
    const units = this.store.sequence()?.stepList.facts.unitSystem;
    return view && units ? outsideSteps(view, units, this.language()) : [];
  });

  protected readonly keys = REVIEW_KEYS;
  protected readonly isCircuit = ({ specification: { level = 'circuit' } }: SequenceDetail): boolean =>
    level === 'circuit';
  protected readonly photoUrl = (sha256: string, size: 'full' | 'thumbnail'): string =>
    this.api.photoUrl(this.sequenceId(), sha256, size);

  constructor() {
    // The router sets inputs; the store is above them and has to be told.
    effect(() => this.store.sequenceId.set(this.sequenceId()));
    effect(() => {
      const code = this.store.sequence()?.specification.circuit.code;
      const review = this.words.translate<string>('shell.pageReview', {}, this.language());
      if (code) this.titles.set(`${code} · ${review}`);
    });
    // The panel that held the keyboard goes with the verdict; what it led to takes its place.
    effect(() => {
      if (this.store.given() !== null) this.focus.moveTo('review-told');
      else if (this.store.isChanged()) this.focus.keep('review-told');
    });
    inject(LiveEvents)
      .on('sequenceChanged')
      .pipe(
        filter((event) => event.sequenceId === this.sequenceId()),
        auditTime(500),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.store.readAnew());
  }

  protected show(key: string): void {
    this.isListOpen.set(false);
    void this.router.navigate([], {
      queryParams: { step: key },
      queryParamsHandling: 'merge',
      replaceUrl: true,
    });
    this.focus.keep('step-title');
  }

  /** A phone shows the list instead of the evidence. */
  protected showList(key: string): void {
    this.isListOpen.set(true);
    this.focus.keep(`step-${key}`);
  }

  /** Out of the remark, with the keyboard on its step: from there the keys walk on. */
  protected leaveRemark(key: string): void {
    this.focus.moveTo(`step-${key}`, 'step-title');
  }

  protected acknowledgeChange(): void {
    this.store.acknowledgeChange();
    this.focus.moveTo('step-title');
  }

  protected move(by: 1 | -1): void {
    const items = this.store.items();
    const next = items[items.findIndex((item) => item === this.item()) + by];
    if (!next) return;
    this.show(next.view.step.key);
    this.document.getElementById(`step-${next.view.step.key}`)?.scrollIntoView({ block: 'nearest' });
  }

  protected openPhoto(index: number): void {
    const item = this.item();
    const urls = photosOf(item?.view.current ?? null).map((sha256) => this.photoUrl(sha256, 'full'));
    if (!item || urls.length === 0) return;
    const data: PhotoSet = { urls, start: index, title: item.view.step.title[this.language()] };
    this.dialog.open(PhotoDialog, {
      data,
      width: '96vw',
      maxWidth: '96vw',
      height: '94dvh',
      ariaLabel: data.title,
    });
  }

  protected press(event: KeyboardEvent): void {
    const action = reviewAction(event);
    if (action === null || !this.store.sequence() || this.dialog.openDialogs.length > 0) return;
    event.preventDefault();
    this.act(action);
  }

  protected setMode(mode: VerdictMode): void {
    const before = this.store.mode();
    this.store.setMode(mode);
    // Whoever turns back stands on the button that opened the panel.
    this.focus.moveTo(mode === 'closed' ? `verdict-${before}` : 'verdict-title');
  }

  private goToNext(): void {
    const next = this.store.next();
    if (next) void this.router.navigate(['/review', next.sequenceId]);
  }

  private act(action: ReviewAction): void {
    switch (action) {
      case 'next':
        return this.move(1);
      case 'previous':
        return this.move(-1);
      case 'photo':
        return this.openPhoto(0);
      case 'remark':
        return this.evidence()?.writeRemark();
      case 'approve':
        return this.store.canReview() ? this.setMode('approve') : undefined;
      case 'sendBack':
        return this.store.canReview() ? this.setMode('sendBack') : undefined;
      case 'queueNext':
        return this.goToNext();
      case 'help':
        return this.isHelpOpen.update((isOpen) => !isOpen);
      default:
        return unreachable(action);
    }
  }
}
