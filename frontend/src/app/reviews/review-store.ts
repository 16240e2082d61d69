import {
  computed,
  effect,
  inject,
  Injectable,
  linkedSignal,
  resource,
  signal,
  untracked,
} from '@angular/core';
import type { Signature } from '#shared/checklist/signature';
import type { ReviewRequest } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { viewSequence } from '#shared/sequences/sequence-view';
import { Session } from '../session/session';
import { lastRead } from '../ui/pages/last-read';
import { lastSentBack, reviewedRound } from './attention-facts';
import { orderForReview } from './attention-order';
import { reviewBar } from './can-review';
import { orderQueue } from './queue-order';
import { lackingOf } from './refused-approval';
import { keepDrafts, remarksOf, restoreDrafts, type Drafts } from './remark-drafts';
import { ReviewsApi } from './reviews-api';
import type { VerdictMode } from './verdict-panel';
import { VerdictSender } from './verdict-sender';

interface GivenVerdict {
  readonly verdict: ReviewRequest['verdict'];
  readonly headHash: string;
}

/** One sequence under review: what was read, what was written about it, and the verdict. Provided by its page. */
@Injectable()
export class ReviewStore {
  private readonly api = inject(ReviewsApi);
  private readonly session = inject(Session);
  private readonly sender = inject(VerdictSender);

  /** Which sequence is shown; its page says so. */
  readonly sequenceId = signal<SequenceId | null>(null);
  readonly detail = resource({
    params: () => this.sequenceId() ?? undefined,
    loader: ({ params }) => this.api.sequence(params),
  });
  private readonly read = lastRead(this.detail);
  /** Never another one's, not even for a moment after the reader went on to the next. */
  readonly sequence = computed(() => {
    const read = this.read();
    return read?.id === this.sequenceId() ? read : undefined;
  });
  readonly view = computed(() => {
    const sequence = this.sequence();
    return sequence ? viewSequence(sequence.stepList, sequence.entries) : null;
  });
  readonly order = computed(() => {
    const view = this.view();
    const sequence = this.sequence();
    return view && sequence
      ? orderForReview(view, sequence.photos, lastSentBack(sequence.entries))
      : { first: [], rest: [] };
  });
  /** The round that is under review, or was reviewed last. */
  readonly round = computed(() => reviewedRound(this.sequence()?.entries ?? []));
  /** All steps in the order in which the keys walk through them. */
  readonly items = computed(() => [...this.order().first, ...this.order().rest]);
  readonly bar = computed(() => {
    const sequence = this.sequence();
    if (!sequence) return 'notSubmitted';
    const mayReview = this.session.may('review.give', sequence.openingId);
    return reviewBar(sequence.fold, this.session.me()?.id ?? null, mayReview);
  });
  readonly canReview = computed(() => this.bar() === null);

  /** Remarks as they are being written; a reload of the tab brings them back. */
  private readonly written = linkedSignal<SequenceId | null, { id: SequenceId | null; drafts: Drafts }>({
    source: this.sequenceId,
    computation: (id) => ({ id, drafts: id === null ? {} : restoreDrafts(sessionStorage, id) }),
  });
  readonly drafts = computed(() => this.written().drafts);
  readonly remarks = computed(() => {
    const steps = this.sequence()?.stepList.steps ?? [];
    return remarksOf(this.drafts(), steps).flatMap((remark) => {
      const step = steps.find(({ key }) => key === remark.stepKey);
      return step ? [{ remark, step }] : [];
    });
  });

  private readonly head = computed(() => this.sequence()?.fold.headHash);
  /** Whoever signed or meant to sign for earlier evidence has not signed for this: a new head starts unsigned. */
  readonly signature = linkedSignal<string | undefined, Signature | null>({
    source: this.head,
    computation: () => null,
  });
  readonly mode = linkedSignal<string | undefined, VerdictMode>({
    source: this.head,
    computation: (_head, before) => (before?.value === 'sendBack' ? 'sendBack' : 'closed'),
  });
  /** The verdict given on this page and the head it was given on; gone with the sequence. */
  private readonly verdict = linkedSignal<SequenceId | null, GivenVerdict | null>({
    source: this.sequenceId,
    computation: () => null,
  });
  /** The verdict that was given on this page, as long as it stands: until the installer submits again. */
  readonly given = computed(() => {
    const verdict = this.verdict();
    const fold = this.sequence()?.fold;
    if (!verdict || !fold) return null;
    return fold.state === verdict.verdict || fold.headHash === verdict.headHash ? verdict.verdict : null;
  });
  private readonly changed = linkedSignal<{ id: SequenceId | null; head: string | undefined }, boolean>({
    source: () => ({ id: this.sequenceId(), head: this.head() }),
    computation: ({ id, head }, before) =>
      head !== undefined &&
      before?.source.id === id &&
      before.source.head !== undefined &&
      (before.source.head === head ? before.value : untracked(this.given) === null),
  });
  /** Whether what is to be judged changed under the reader's eyes, which they have to know before they sign. */
  readonly isChanged = computed(() => this.changed() && this.canReview());
  /** Whether that change is a new submission, after a verdict on this page. */
  readonly isSubmittedAgain = computed(() => this.isChanged() && this.verdict() !== null);

  /** What the server says the approval lacks. */
  readonly lacking = computed(() => lackingOf(this.sender.problem(), this.sequence()?.stepList.steps ?? []));

  /** Asked only once there is a verdict: what waits next, as the queue orders it. */
  private readonly queue = resource({
    params: () => (this.given() === null ? undefined : { after: this.sequenceId() }),
    loader: () => this.api.queue(null),
  });
  readonly next = computed(() => {
    const items = this.queue.hasValue() ? this.queue.value().items : [];
    return (
      orderQueue(items).find(
        ({ sequenceId, fourEyesBlocked }) => sequenceId !== this.sequenceId() && !fourEyesBlocked,
      ) ?? null
    );
  });

  constructor() {
    // Pushes out of Angular, into the tab's storage.
    effect(() => {
      const { id, drafts } = this.written();
      if (id !== null) keepDrafts(sessionStorage, id, drafts);
    });
  }

  setRemark(stepKey: string, text: string): void {
    this.written.update(({ id, drafts }) => ({ id, drafts: { ...drafts, [stepKey]: text } }));
  }

  setMode(mode: VerdictMode): void {
    this.sender.clear();
    this.mode.set(mode);
    if (mode === 'closed') this.signature.set(null);
  }

  /** The reader has seen that it changed. */
  acknowledgeChange(): void {
    this.changed.set(false);
    if (this.given() === null) this.verdict.set(null);
  }

  /** Reads again after a hint that it changed. */
  readAnew(): void {
    if (!this.sender.isSending()) this.detail.reload();
  }

  async approve(): Promise<void> {
    const signature = this.signature();
    const headHash = this.sequence()?.fold.headHash;
    if (signature && headHash) await this.give({ verdict: 'approved', headHash, signature });
  }

  async sendBack(): Promise<void> {
    const remarks = this.remarks().map(({ remark }) => remark);
    const headHash = this.sequence()?.fold.headHash;
    if (remarks.length > 0 && headHash) await this.give({ verdict: 'sentBack', headHash, remarks });
  }

  private async give(request: ReviewRequest): Promise<void> {
    const sequenceId = this.sequenceId();
    if (sequenceId === null) return;
    const result = await this.sender.send(sequenceId, request);
    if (result === 'changed') this.detail.reload();
    if (result !== 'given') return;
    this.verdict.set({ verdict: request.verdict, headHash: request.headHash });
    this.written.update(({ id }) => ({ id, drafts: {} }));
    this.setMode('closed');
    this.detail.reload();
  }
}
