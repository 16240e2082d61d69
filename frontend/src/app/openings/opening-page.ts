import { ChangeDetectionStrategy, Component, computed, inject, input, resource, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { auditTime, filter, merge } from 'rxjs';
import type { Action } from '#shared/access/may';
import type { CircuitRow, OpeningDetail } from '#shared/contracts/openings';
import type { OpeningId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { CopperLine } from '../ui/copper-line/copper-line';
import { DateOf } from '../ui/date-of';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { DaysLeft } from '../ui/pages/days-left';
import { lastRead } from '../ui/pages/last-read';
import { StateMark } from '../ui/state-mark/state-mark';
import { countedKey } from '../ui/words/counted';
import { QuantityOf } from '../ui/quantity-of';
import { circuitTotal, stateCounts } from './opening-counts';
import { systemLines } from './system-lines';
import { OpeningsApi } from './openings-api';

/** One opening: how long there is, how far each system is, joint by joint, and what to do next. Follows events live. */
@Component({
  selector: 'app-opening-page',
  imports: [
    CopperLine,
    DateOf,
    DaysLeft,
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    ProblemNote,
    QuantityOf,
    RouterLink,
    StateMark,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './opening-page.html',
  styleUrl: './opening-page.scss',
})
export class OpeningPage {
  readonly openingId = input.required<OpeningId>();

  private readonly api = inject(OpeningsApi);
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly online = inject(Connectivity).online;
  protected readonly countedKey = countedKey;

  protected readonly detail = resource({
    params: () => this.openingId(),
    loader: ({ params }) => this.api.opening(params),
  });
  protected readonly opening = lastRead<OpeningDetail>(this.detail);
  protected readonly systems = computed(() => systemLines(this.opening()?.systems ?? []));
  protected readonly total = computed(() => circuitTotal(this.opening()?.counts ?? NONE));
  protected readonly counts = computed(() => stateCounts(this.opening()?.counts ?? NONE));
  /** Circuits that no template applies to: they can't be approved, and are told apart. */
  protected readonly withoutChecklist = computed(() =>
    this.systems().reduce((sum, { joints, total }) => sum + joints.length - total, 0),
  );
  protected readonly isEmpty = computed(() => this.systems().every(({ joints }) => joints.length === 0));
  protected readonly mayImport = computed(() => this.may('schedule.import'));
  protected readonly mayList = computed(() => this.may('circuit.list'));
  protected readonly mayReview = computed(() => this.may('review.read'));
  protected readonly maySeeDefrost = computed(() => this.may('defrostPlan.read'));
  protected readonly maySeePackages = computed(() => this.may('package.read'));

  /** Tables are a company's: only those who work for the owner of this opening can look at the ones it works with. */
  protected readonly maySeeRefrigerants = computed(() =>
    this.session.may('refrigerant.read', undefined, this.opening()?.companyId),
  );

  protected readonly problem = signal<unknown>(null);

  constructor() {
    const live = inject(LiveEvents);
    merge(live.on('sequenceChanged'), live.on('scheduleChanged'))
      .pipe(
        filter((event) => event.openingId === this.openingId()),
        auditTime(800),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.detail.reload());
  }

  /** Opens the circuit behind a joint: a lead looks at it, an installer works on it. */
  protected async open(circuitId: string): Promise<void> {
    const circuit = await this.findCircuit(circuitId);
    if (!circuit) return;
    if (circuit.sequenceId) {
      await this.router.navigate([this.mayReview() ? '/review' : '/work', circuit.sequenceId]);
    } else {
      const queryParams = { q: circuit.code };
      await this.router.navigate(['/openings', this.openingId(), 'circuits'], { queryParams });
    }
  }

  private async findCircuit(circuitId: string): Promise<CircuitRow | null> {
    this.problem.set(null);
    try {
      const { items } = await this.api.circuits(this.openingId());
      return items.find((row) => row.circuitId === circuitId) ?? null;
    } catch (error) {
      this.problem.set(error);
      return null;
    }
  }

  private may(action: Action): boolean {
    return this.session.may(action, this.openingId(), this.opening()?.companyId);
  }
}

const NONE: OpeningDetail['counts'] = { open: 0, underWay: 0, submitted: 0, sentBack: 0, approved: 0 };
