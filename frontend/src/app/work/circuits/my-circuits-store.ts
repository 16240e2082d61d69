import { computed, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { CircuitRow } from '#shared/contracts/openings';
import type { PersonId, SequenceId } from '#shared/plant/ids';
import type { SequenceView } from '#shared/sequences/sequence-view';
import { debounceTime, fromEvent } from 'rxjs';
import { Connectivity } from '../../offline/connectivity';
import type { OutboxEntry } from '../../offline/local-database';
import { Outbox } from '../../offline/outbox';
import { SequenceCache } from '../../offline/sequence-cache';
import { Session } from '../../session/session';
import { LiveEvents } from '../../shell/live-events';
import { localView } from '../sequence/local-view';
import { WorkApi } from '../work-api';
import { groupCircuits, type WorkRow } from './circuit-groups';
import { listZone } from './list-zone';
import { TakeAlong } from './take-along';

/** The circuits assigned to whoever is here; from this phone at once, then as the server has them. */
@Injectable()
export class MyCircuitsStore {
  private readonly api = inject(WorkApi);
  private readonly cache = inject(SequenceCache);
  private readonly outbox = inject(Outbox);
  private readonly takeAlong = inject(TakeAlong);
  private readonly me = inject(Session).me;
  private readonly online = inject(Connectivity).online;
  private readonly rows = signal<readonly CircuitRow[] | null>(null);
  private readonly views = signal<ReadonlyMap<SequenceId, SequenceView>>(new Map());
  private readonly failure = signal<unknown>(null);
  private readonly read = signal<string | null>(null);
  private readonly zone = signal(ownZone());

  readonly problem = this.failure.asReadonly();
  readonly readAt = this.read.asReadonly();
  /** On whose clock `readAt` is told. */
  readonly timeZone = this.zone.asReadonly();
  readonly isLoading = computed(() => this.rows() === null && this.failure() === null);
  readonly isEmpty = computed(() => this.rows()?.length === 0);
  readonly hasNothing = computed(() => (this.rows()?.length ?? 0) === 0);
  readonly day = computed(() => {
    const entries = this.outbox.entries();
    return groupCircuits((this.rows() ?? []).map((row) => workRow(row, this.views(), entries)));
  });

  constructor() {
    effect(() => {
      // Only circuits with something unsent can differ from what the server said.
      const touched = new Set(this.outbox.entries().map((entry) => entry.sequenceId));
      untracked(() => void this.lookAgain(touched));
    });
    inject(LiveEvents)
      .on('sequenceChanged')
      .pipe(debounceTime(1_000), takeUntilDestroyed())
      .subscribe(() => void this.refresh());
    fromEvent(document, 'visibilitychange')
      .pipe(takeUntilDestroyed())
      .subscribe(() => {
        if (document.visibilityState === 'visible') void this.refresh();
      });
  }

  async open(): Promise<void> {
    const me = this.me();
    if (!me) return;
    const kept = await this.cache.work(me.id);
    if (kept) {
      this.rows.set(kept.rows);
      this.read.set(kept.readAt);
      await this.findZone(me.id, kept.rows);
    }
    await this.refresh();
  }

  async refresh(): Promise<void> {
    const me = this.me();
    if (!me || (!this.online() && this.rows())) return;
    try {
      const rows = await this.api.myCircuits();
      const now = new Date().toISOString();
      await this.cache.keepWork(me.id, rows, now);
      this.rows.set(rows);
      this.read.set(now);
      this.failure.set(null);
      void this.takeAlong.take(me.id, rows).then(() => this.findZone(me.id, rows));
    } catch (error) {
      this.failure.set(error);
    }
  }

  private async findZone(personId: PersonId, rows: readonly CircuitRow[]): Promise<void> {
    const zoneOf = async (id: SequenceId): Promise<string | null> =>
      (await this.cache.sequence(personId, id))?.detail.timeZone ?? null;
    this.zone.set(await listZone(rows, zoneOf, ownZone()));
  }

  private async lookAgain(touched: ReadonlySet<SequenceId>): Promise<void> {
    const me = this.me();
    if (!me) return;
    const views = await Promise.all([...touched].map((id) => this.viewOf(me.id, id)));
    this.views.set(new Map(views.filter((view) => view !== null)));
  }

  private async viewOf(personId: PersonId, id: SequenceId): Promise<[SequenceId, SequenceView] | null> {
    const cached = await this.cache.sequence(personId, id);
    return cached && [id, localView(cached, this.outbox.entries())];
  }
}

function ownZone(): string {
  return Intl.DateTimeFormat().resolvedOptions().timeZone;
}

function workRow(
  row: CircuitRow,
  views: ReadonlyMap<SequenceId, SequenceView>,
  entries: readonly OutboxEntry[],
): WorkRow {
  const unsentCount = entries.filter((entry) => entry.sequenceId === row.sequenceId).length;
  const view = row.sequenceId ? views.get(row.sequenceId) : undefined;
  if (!view || unsentCount === 0) return { ...row, unsentCount };
  const { state } = view.fold;
  return {
    ...row,
    unsentCount,
    state: state === 'open' ? 'underWay' : state,
    stepsDone: view.doneCount,
    stepsTotal: view.steps.length,
    outsideCount: view.outsideCount,
  };
}
