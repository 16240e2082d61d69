import { computed, DestroyRef, inject, Injectable, linkedSignal, resource, signal } from '@angular/core';
import { missingFigures, plannedCircuits, possibleBoxes } from '#shared/contracts/defrost-circuits';
import { startsInBreach } from '#shared/contracts/defrost-chart';
import type { DefrostDetails, DefrostPlanPage, SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import type { CircuitId, OpeningId } from '#shared/plant/ids';
import { checkDefrostPlan } from '#shared/refrigeration/defrost/check-defrost-plan';
import { concurrentLoad } from '#shared/refrigeration/defrost/concurrent-load';
import { startsOf } from '#shared/refrigeration/defrost/defrosts-of-plan';
import type { DefrostPlanning } from '#shared/refrigeration/defrost/plan-defrosts';
import { lastRead } from '../ui/pages/last-read';
import { problemCodeOf, problemOf } from '../ui/problem-of';
import { DefrostsApi } from './defrosts-api';
import {
  draftOf,
  keeping,
  moved,
  withDetails,
  withPlan,
  type ChosenStart,
  type PlanDraft,
} from './plan-draft';
import { Planner } from './planner';

export type Blocked = Extract<DefrostPlanning, { readonly reason: 'blocked' }>;

/** The plan on the screen: what was saved, what was changed since, and what is wrong with it. */
@Injectable()
export class DefrostStore {
  private readonly api = inject(DefrostsApi);
  private readonly planner = inject(Planner);
  private readonly openingId = signal<OpeningId | undefined>(undefined);
  private running: AbortController | null = null;

  readonly read = resource({
    params: () => this.openingId(),
    loader: ({ params }) => this.api.read(params),
  });
  readonly page = lastRead<DefrostPlanPage>(this.read);
  /** Saved here since the page was read. */
  private readonly saved = linkedSignal<DefrostPlanPage | undefined, SavedDefrostPlan | null>({
    source: this.page,
    computation: (page) => page?.newest ?? null,
  });
  readonly newest = this.saved.asReadonly();
  readonly draft = linkedSignal<PlanDraft | undefined>(() => {
    const page = this.page();
    return page && draftOf(page);
  });
  /** The draft as it was last read or saved. */
  private readonly clean = linkedSignal<PlanDraft | undefined>(() => {
    const page = this.page();
    return page && draftOf(page);
  });
  readonly isChanged = computed(() => JSON.stringify(this.draft()) !== JSON.stringify(this.clean()));

  readonly circuits = computed(() => plannedCircuits(this.scheduled(), this.draft()?.details ?? []));
  readonly missing = computed(() => missingFigures(this.scheduled(), this.draft()?.details ?? []));
  readonly possibleBoxes = computed(() => possibleBoxes(this.scheduled(), this.draft()?.details ?? []));
  readonly check = computed(() => {
    const draft = this.draft();
    return draft && checkDefrostPlan(this.circuits(), draft.rules, draft.plan);
  });
  readonly breaches = computed(() => {
    const check = this.check();
    return check?.ok ? check.breaches : [];
  });
  readonly notes = computed(() => {
    const check = this.check();
    return check?.ok ? check.notes : [];
  });
  readonly marked = computed(() =>
    startsInBreach(this.breaches(), this.circuits(), this.draft()?.plan ?? []),
  );
  readonly load = computed(() => concurrentLoad(this.circuits(), this.draft()?.plan ?? []));

  readonly chosen = signal<ChosenStart | null>(null);
  readonly isPlanning = signal(false);
  readonly blocked = signal<Blocked | null>(null);
  readonly planFailure = signal<unknown>(null);
  readonly isSaving = signal(false);
  readonly saveFailure = signal<unknown>(null);
  /** The version that somebody else saved meanwhile. */
  readonly meanwhile = signal<number | null>(null);
  private readonly faults = signal<ReadonlySet<string>>(new Set());
  readonly hasFaults = computed(() => this.faults().size > 0);

  constructor() {
    inject(DestroyRef).onDestroy(() => this.running?.abort());
  }

  private readonly scheduled = computed(() => this.page()?.circuits ?? []);

  open(openingId: OpeningId): void {
    this.openingId.set(openingId);
  }

  change(change: (draft: PlanDraft) => PlanDraft): void {
    this.draft.update((draft) => draft && change(draft));
  }

  changeDetails(circuitId: CircuitId, change: Partial<DefrostDetails>): void {
    this.change((draft) => withDetails(draft, circuitId, change));
  }

  /** A field that can't be read keeps its last figure in the draft; nothing is saved while there is one. */
  noteFault(field: string, isFaulty: boolean): void {
    if (this.faults().has(field) === isFaulty) return;
    const faults = new Set(this.faults());
    if (isFaulty) faults.add(field);
    else faults.delete(field);
    this.faults.set(faults);
  }

  /** A start that has moved on since it was drawn (a key held down is faster than the screen) is not chosen again. */
  choose(chosen: ChosenStart): void {
    if (startsOf(this.draft()?.plan ?? [], chosen.circuitId).includes(chosen.startS)) this.chosen.set(chosen);
  }

  move(byS: number): void {
    const draft = this.draft();
    const chosen = this.chosen();
    if (!draft || !chosen) return;
    const result = moved(draft, chosen, byS);
    this.draft.set(result.draft);
    this.chosen.set(result.chosen);
  }

  keep(isToKeep: boolean): void {
    const chosen = this.chosen();
    if (chosen) this.change((draft) => keeping(draft, chosen, isToKeep));
  }

  /** Lays the day out; starts kept by hand stay. One at a time: a new one ends the one before. */
  async layOut(): Promise<void> {
    const draft = this.draft();
    if (!draft) return;
    this.running?.abort();
    const running = new AbortController();
    this.running = running;
    this.isPlanning.set(true);
    this.planFailure.set(null);
    try {
      const planning = await this.planner.plan(
        { circuits: this.circuits(), rules: draft.rules },
        running.signal,
      );
      if (this.running === running) this.take(planning);
    } catch (error) {
      if (!running.signal.aborted) this.planFailure.set(error);
    } finally {
      if (this.running === running) this.isPlanning.set(false);
    }
  }

  stop(): void {
    this.running?.abort();
    this.isPlanning.set(false);
  }

  /** @param basedOn the version that this is put upon; the newest that was read here unless told otherwise */
  async save(basedOn = this.newest()?.version ?? 0): Promise<void> {
    const openingId = this.openingId();
    const draft = this.draft();
    if (!openingId || !draft || this.isSaving()) return;
    this.isSaving.set(true);
    this.saveFailure.set(null);
    this.meanwhile.set(null);
    try {
      this.saved.set(await this.api.save(openingId, { basedOn, ...draft }));
      this.clean.set(draft);
    } catch (error) {
      const version = problemOf(error)?.facts['version'];
      if (problemCodeOf(error) === 'changedMeanwhile') this.meanwhile.set(Number(version ?? basedOn + 1));
      else this.saveFailure.set(error);
    } finally {
      this.isSaving.set(false);
    }
  }

  /** Gives the own changes up for what is stored now. */
  async takeTheirs(): Promise<void> {
    const openingId = this.openingId();
    if (!openingId) return;
    this.meanwhile.set(null);
    this.chosen.set(null);
    this.read.reload();
  }

  private take(planning: DefrostPlanning): void {
    this.blocked.set(planning.ok || planning.reason !== 'blocked' ? null : planning);
    if (!planning.ok && planning.reason === 'inputProblems') return;
    this.change((draft) => withPlan(draft, planning.ok ? planning.plan : planning.partialPlan));
    this.chosen.set(null);
  }
}
