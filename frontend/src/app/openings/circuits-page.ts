import { ChangeDetectionStrategy, Component, computed, inject, input, resource, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { auditTime, filter, merge } from 'rxjs';
import type { CircuitId, OpeningId, PersonId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { STATES_IN_ORDER } from '../ui/copper-line/line-summary';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { lastRead } from '../ui/pages/last-read';
import { countedKey } from '../ui/words/counted';
import { areasOf, filterCircuits, NOBODY } from './circuit-filter';
import { NOTHING_SELECTED, toggle, toggleAll } from './circuit-selection';
import { CircuitTable } from './circuit-table';
import { OpeningsApi } from './openings-api';

/** All circuits of an opening in one dense table: find, select, give to people. The filter stands in the address. */
@Component({
  selector: 'app-circuits-page',
  imports: [
    CircuitTable,
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    ProblemNote,
    RouterLink,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './circuits-page.html',
  styleUrl: './circuits-page.scss',
})
export class CircuitsPage {
  readonly openingId = input.required<OpeningId>();
  readonly q = input<string>();
  readonly area = input<string>();
  readonly state = input<string>();
  readonly assignee = input<string>();

  private readonly api = inject(OpeningsApi);
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  protected readonly online = inject(Connectivity).online;

  protected readonly states = STATES_IN_ORDER;
  protected readonly nobody = NOBODY;
  protected readonly countedKey = countedKey;
  protected readonly list = resource({
    params: () => this.openingId(),
    loader: ({ params }) => this.api.circuits(params),
  });
  protected readonly read = lastRead(this.list);
  protected readonly mayAssign = computed(() => this.session.may('circuit.assign', this.openingId()));
  protected readonly people = resource({
    params: () => (this.mayAssign() ? this.openingId() : undefined),
    loader: ({ params }) => this.api.people(params),
  });
  protected readonly rows = computed(() => this.read()?.items ?? []);
  /** The work of systems and groups stands in the table, and is no circuit. */
  protected readonly circuitCount = computed(
    () => this.rows().filter(({ level }) => level === 'circuit').length,
  );
  protected readonly areas = computed(() => areasOf(this.rows()));
  protected readonly assignable = computed(() =>
    (this.people.hasValue() ? this.people.value() : []).filter(({ role }) => role !== 'contractor'),
  );
  protected readonly shown = computed(() =>
    filterCircuits(this.rows(), {
      text: this.q() ?? '',
      area: this.area() ?? '',
      state: this.state() ?? '',
      assignee: this.assignee() ?? '',
    }),
  );
  protected readonly isNarrowed = computed(() => this.shown().length < this.rows().length);
  private readonly selection = signal(NOTHING_SELECTED);
  protected readonly selected = computed(() => this.selection().ids);
  protected readonly hiddenSelected = computed(() => {
    const shown = new Set<string>(this.shown().map(({ circuitId }) => circuitId));
    return [...this.selected()].filter((id) => !shown.has(id)).length;
  });
  protected readonly person = signal('');
  /** What was assigned last, told until something else is selected; `name` is null where it was taken back. */
  protected readonly assigned = signal<{ count: number; name: string | null } | null>(null);
  protected readonly isSending = signal(false);
  protected readonly problem = signal<unknown>(null);

  constructor() {
    const live = inject(LiveEvents);
    merge(live.on('sequenceChanged'), live.on('scheduleChanged'))
      .pipe(
        filter((event) => event.openingId === this.openingId()),
        auditTime(1500),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.list.reload());
  }

  protected narrow(change: Partial<Record<'q' | 'area' | 'state' | 'assignee', string>>): void {
    const queryParams = Object.fromEntries(
      Object.entries(change).map(([key, value]) => [key, value || null]),
    );
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }

  protected widen(): void {
    void this.router.navigate([], { queryParams: {}, replaceUrl: true });
  }

  protected toggle(id: string, isRange: boolean): void {
    this.assigned.set(null);
    this.selection.set(toggle(this.selection(), this.shownIds(), id, isRange));
  }

  protected toggleAll(): void {
    this.assigned.set(null);
    this.selection.set(toggleAll(this.selection(), this.shownIds()));
  }

  protected clearSelection(): void {
    this.selection.set(NOTHING_SELECTED);
  }

  /** Gives what is selected to the chosen person; `nobody` takes it from whoever has it. */
  protected async assign(): Promise<void> {
    if (this.person() === '' || this.isSending()) return;
    this.isSending.set(true);
    this.problem.set(null);
    const personId = this.person() === NOBODY ? null : (this.person() as PersonId);
    try {
      await this.api.assign(this.openingId(), [...this.selected()] as CircuitId[], personId);
      const name = this.assignable().find(({ id }) => id === personId)?.name ?? null;
      const count = this.selected().size;
      this.clearSelection();
      this.assigned.set({ count, name });
      this.list.reload();
    } catch (error) {
      this.problem.set(error);
    } finally {
      this.isSending.set(false);
    }
  }

  private shownIds(): readonly string[] {
    return this.shown().map(({ circuitId }) => circuitId);
  }
}
