import { computed, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Judgement } from '#shared/checklist/judgement';
import type { Answer } from '#shared/checklist/step';
import type { PersonId, SequenceId } from '#shared/plant/ids';
import type { EntryContent } from '#shared/sequences/entry';
import type { StepView } from '#shared/sequences/sequence-view';
import { debounceTime, filter, fromEvent } from 'rxjs';
import { Connectivity } from '../../offline/connectivity';
import { isStuck } from '../../offline/delivery-batches';
import type { CachedSequence, OutboxEntry } from '../../offline/local-database';
import { Outbox } from '../../offline/outbox';
import { SequenceCache } from '../../offline/sequence-cache';
import { Session } from '../../session/session';
import { LiveEvents } from '../../shell/live-events';
import { WorkApi } from '../work-api';
import { localView, restsOn } from './local-view';

/** `failed`: nothing of it is on this phone, and the server didn't give it. */
export type SequenceStatus = 'loading' | 'ready' | 'failed';

/**
 * One sequence as an installer works on it. Screens read the local copy, never HTTP: what was recorded shows at once,
 * and the server's copy is folded in whenever it can be read.
 */
@Injectable()
export class SequenceStore {
  private readonly api = inject(WorkApi);
  private readonly cache = inject(SequenceCache);
  private readonly outbox = inject(Outbox);
  private readonly session = inject(Session);
  private readonly online = inject(Connectivity).online;
  private readonly id = signal<SequenceId | null>(null);
  /** Both parts are set together, so that an entry on its way from one to the other never flickers out of sight. */
  private readonly local = signal<{ cached: CachedSequence; outbox: readonly OutboxEntry[] } | null>(null);
  private readonly failure = signal<unknown>(null);
  private readonly settled = signal(false);

  readonly problem = this.failure.asReadonly();
  /** Whether the server was asked since opening, or can't be: what a lead sent back is then known, if it ever will be. */
  readonly isSettled = this.settled.asReadonly();
  readonly detail = computed(() => this.local()?.cached.detail ?? null);
  readonly readAt = computed(() => this.local()?.cached.readAt ?? null);
  readonly status = computed<SequenceStatus>(() => {
    if (this.local()) return 'ready';
    return this.failure() === null ? 'loading' : 'failed';
  });
  readonly view = computed(() => {
    const local = this.local();
    return local ? localView(local.cached, local.outbox) : null;
  });
  private readonly ownOutbox = computed(
    () => this.local()?.outbox.filter((entry) => entry.sequenceId === this.id()) ?? [],
  );
  /** Refused, or the server fails on it again and again: people have to know. */
  readonly troubled = computed(() =>
    this.ownOutbox().filter((entry) => entry.state === 'refused' || isStuck(entry)),
  );
  readonly unsentCount = computed(() => this.ownOutbox().filter((entry) => entry.state === 'waiting').length);
  readonly people = computed(() => new Map((this.detail()?.people ?? []).map(({ id, name }) => [id, name])));

  constructor() {
    effect(() => {
      this.outbox.entries();
      this.outbox.deliveries();
      if (this.id()) untracked(() => void this.readLocal());
    });
    inject(LiveEvents)
      .on('sequenceChanged')
      .pipe(
        filter((event) => event.sequenceId === this.id()),
        debounceTime(600),
        takeUntilDestroyed(),
      )
      .subscribe(() => void this.refresh());
    fromEvent(document, 'visibilitychange')
      .pipe(
        filter(() => document.visibilityState === 'visible'),
        takeUntilDestroyed(),
      )
      .subscribe(() => void this.refresh());
  }

  /** Opens a sequence: from this phone at once, then as the server has it. */
  async open(id: SequenceId): Promise<void> {
    this.id.set(id);
    this.local.set(null);
    this.failure.set(null);
    this.settled.set(false);
    await this.readLocal();
    await this.refresh();
    this.settled.set(true);
  }

  /** Reads the server's copy. Without a network the local one stays, and says when it was read. */
  async refresh(): Promise<void> {
    const id = this.id();
    const me = this.session.me();
    if (!id || !me || (!this.online() && this.local())) return;
    try {
      const detail = await this.api.sequence(id);
      await this.cache.keepSequence(me.id, detail, new Date().toISOString());
      this.failure.set(null);
      await this.readLocal();
    } catch (error) {
      this.failure.set(error);
    }
  }

  /** Records an answer; it supersedes whatever this phone saw on the step. */
  async record(view: StepView, answer: Answer, judgement: Judgement): Promise<void> {
    const { outcome, counts, figures } = judgement;
    const content = {
      kind: 'answer',
      stepKey: view.step.key,
      answer,
      workedOut: { outcome, counts, figures },
    } as const;
    await this.append(content, view, judgement);
  }

  /** @param reason at least three characters, in the words of whoever stands there */
  async recordNotApplicable(view: StepView, reason: string): Promise<void> {
    await this.append({ kind: 'notApplicable', stepKey: view.step.key, reason }, view, null);
  }

  /** Hands the sequence to a lead. Takes effect on the server once all it rests on has arrived. */
  async submit(): Promise<void> {
    const view = this.view();
    if (view) await this.append({ kind: 'submission', restsOn: restsOn(view) }, null, null);
  }

  async retry(entry: OutboxEntry): Promise<void> {
    await this.outbox.retry(entry.id);
  }

  nameOf(id: PersonId): string {
    const me = this.session.me();
    return this.people().get(id) ?? (me?.id === id ? me.name : '');
  }

  private async append(
    content: EntryContent,
    view: StepView | null,
    judgement: Judgement | null,
  ): Promise<void> {
    const id = this.id();
    if (!id) return;
    await this.outbox.append(id, content, {
      stepListHash: this.detail()?.stepListHash ?? null,
      supersedes: view?.fold?.entryId ?? null,
      judgement,
    });
    await this.readLocal();
  }

  private async readLocal(): Promise<void> {
    const id = this.id();
    const me = this.session.me();
    if (!id || !me) return;
    // The outbox first: an entry acknowledged in between is then in both, and shows once.
    const outbox = this.outbox.entries();
    const cached = await this.cache.sequence(me.id, id);
    if (cached && this.id() === id) this.local.set({ cached, outbox });
  }
}
