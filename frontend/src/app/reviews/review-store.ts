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
import { orderForReview } from './attention-order';
import { reviewBar } from './can-review';
import { keepDrafts, remarksOf, restoreDrafts, type Drafts } from './remark-drafts';
import { ReviewsApi } from './reviews-api';
import type { VerdictMode } from './verdict-panel';
import { VerdictSender } from './verdict-sender';

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
  readonly sequence = lastRead(this.detail);
  readonly view = computed(() => {
    const sequence = this.sequence();
    return sequence ? viewSequence(sequence.stepList, sequence.entries) : null;
  });
  readonly order = computed(() => {
    const view = this.view();
    return view ? orderForReview(view, this.sequence()?.photos ?? []) : { first: [], rest: [] };
  });
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
  private readonly verdict = signal<'approved' | 'sentBack' | null>(null);
  private readonly changed = linkedSignal<string | undefined, boolean>({
    source: this.head,
    computation: (head, before) =>
      before?.source !== undefined && head !== undefined && untracked(this.verdict) === null,
  });
  /** Whether what is to be judged changed under the reader's eyes, which they have to know before they sign. */
  readonly isChanged = computed(() => this.changed() && this.canReview());
  /** The verdict that was given on this page, if any. */
  readonly given = this.verdict.asReadonly();

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
    this.verdict.set(request.verdict);
    this.written.update(({ id }) => ({ id, drafts: {} }));
    this.setMode('closed');
    this.detail.reload();
  }
}
