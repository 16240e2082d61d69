import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  Injector,
  input,
  output,
} from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import { startKey } from '#shared/contracts/defrost-chart';
import type { PlannedCircuit } from '#shared/contracts/defrost-plans';
import { percentText } from '#shared/contracts/defrost-words';
import type { CircuitId } from '#shared/plant/ids';
import type { ConcurrentLoad } from '#shared/refrigeration/defrost/concurrent-load';
import type { DefrostPlan, DefrostRules } from '#shared/refrigeration/defrost/defrost-plan-types';
import { formatQuantity } from '#shared/units/format';
import { readingLanguage } from '../ui/words/reading-language';
import { chartRows, chartStrip, quietRows, type ChartBar, type ChartRow } from './chart-rows';
import { neighbourOf, stepOfKey } from './chart-keys';
import type { ChosenStart } from './plan-draft';

/** Dragging goes by the grid of the clock, like the keys. */
const STEP_S = 300;
const DAY_MINUTES = 1440;

interface Drag {
  readonly pointerId: number;
  readonly fromX: number;
  readonly secondsPerPixel: number;
  movedS: number;
}

/** A day of defrosts, suction group by suction group: rows of circuits, shares of load, heaters. */
@Component({
  selector: 'app-plan-chart',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './plan-chart.html',
  styleUrl: './plan-chart.scss',
})
export class PlanChart {
  readonly circuits = input.required<readonly PlannedCircuit[]>();
  readonly plan = input.required<DefrostPlan>();
  readonly rules = input.required<DefrostRules>();
  readonly load = input.required<ConcurrentLoad>();
  /** Keys of the starts that breaches are about. */
  readonly marked = input.required<ReadonlySet<string>>();
  readonly chosen = input<ChosenStart | null>(null);
  readonly isEditable = input(false);
  readonly choose = output<ChosenStart>();
  readonly chooseCircuit = output<CircuitId>();
  /** By how many seconds the chosen start is to be moved. */
  readonly move = output<number>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);
  private readonly language = readingLanguage();
  private drag: Drag | null = null;

  protected readonly hours = [0, 3, 6, 9, 12, 15, 18, 21, 24];
  protected readonly groups = computed(() =>
    chartRows(this.circuits(), this.plan(), this.rules(), this.load(), this.marked()),
  );
  private readonly rows = computed(() => this.groups().flatMap(({ rows }) => rows));
  protected readonly quiet = computed(() => quietRows(this.rules()));
  protected readonly heaters = computed(() => {
    const { steps, peakW, peakAtS } = this.load().heaters;
    const values = steps.map(({ fromS, demandW }) => ({ fromS, value: demandW }));
    return chartStrip(values, this.rules().largestHeaterDemandW, peakW, peakAtS);
  });
  protected readonly chosenKey = computed(() => {
    const chosen = this.chosen();
    return chosen && startKey(chosen.circuitId, chosen.startS);
  });
  /** One bar is reached by Tab, the others from there by the arrows. */
  protected readonly tabKey = computed(() => {
    const keys = this.rows().flatMap(({ bars }) => bars.map(({ key }) => key));
    const chosen = this.chosenKey();
    return chosen !== null && keys.includes(chosen) ? chosen : (keys[0] ?? null);
  });

  protected hour(hour: number): string {
    return String(hour).padStart(2, '0');
  }

  protected percent(fraction: number): string {
    return percentText(fraction, this.language());
  }

  protected power(watts: number): string {
    return formatQuantity(watts, 'kW_el', this.language());
  }

  protected startsText({ bars }: ChartRow): string {
    return bars.map(({ from }) => from).join(', ');
  }

  protected pick(row: ChartRow, bar: ChartBar): void {
    this.choose.emit({ circuitId: row.circuit.id, startS: bar.startS });
  }

  protected press(event: KeyboardEvent, row: ChartRow, bar: ChartBar): void {
    const byS = stepOfKey(event);
    const next = neighbourOf(event.key, this.rows(), row.circuit.id, bar.startS);
    if (byS === null && next === null) return;
    event.preventDefault();
    if (byS === null) {
      if (next) this.choose.emit(next);
    } else {
      this.pick(row, bar);
      this.move.emit(byS);
    }
    this.focusChosen();
  }

  protected grip(event: PointerEvent, row: ChartRow, bar: ChartBar): void {
    const plot = (event.currentTarget as SVGElement).closest('svg');
    if (!this.isEditable() || event.button !== 0 || !plot) return;
    // By touch the first tap chooses, so that the chart can be pushed sideways from anywhere.
    const isReady = event.pointerType !== 'touch' || bar.key === this.chosenKey();
    this.pick(row, bar);
    if (!isReady) return;
    const { width } = plot.getBoundingClientRect();
    const secondsPerPixel = (DAY_MINUTES * 60) / Math.max(1, width);
    this.drag = { pointerId: event.pointerId, fromX: event.clientX, secondsPerPixel, movedS: 0 };
    plot.setPointerCapture(event.pointerId);
  }

  protected pull(event: PointerEvent): void {
    const { drag } = this;
    if (drag?.pointerId !== event.pointerId) return;
    const wantedS =
      Math.round(((event.clientX - drag.fromX) * drag.secondsPerPixel) / STEP_S) * STEP_S - drag.movedS;
    if (wantedS === 0) return;
    drag.movedS += wantedS;
    this.move.emit(wantedS);
  }

  protected letGo(): void {
    this.drag = null;
  }

  /** By its name: the keys then work on its first defrost, as the help says. */
  protected chooseRow(id: CircuitId): void {
    this.chooseCircuit.emit(id);
    this.focusChosen();
  }

  private focusChosen(): void {
    afterNextRender(
      () => {
        const key = this.chosenKey();
        const bars = this.host.nativeElement.querySelectorAll<SVGElement>('[data-key]');
        [...bars].find((bar) => bar.dataset['key'] === key)?.focus();
      },
      { injector: this.injector },
    );
  }
}
