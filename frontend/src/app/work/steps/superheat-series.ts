import { ChangeDetectionStrategy, Component, computed, inject, input, model, signal } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { SequenceFacts } from '#shared/checklist/facts';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { QuantityOf } from '../../ui/quantity-of';
import { NOW_MS } from '../coil-walk/phone-clock';
import { readSince } from '../coil-walk/clock-text';
import { PairBoxes } from './pair-boxes';
import type { ReadHow } from './superheat-answer';
import { livePair } from './superheat-live';
import { withReading } from './superheat-series-rows';
import type { TypedObservation, TypedPair, TypedReading } from './superheat-typed';

/** As many as an entry takes. */
const MOST_READINGS = 200;

/**
 * A series typed at intervals. One reading at a time has its large boxes; the others are a line each, one tap away from
 * being put right.
 */
@Component({
  selector: 'app-superheat-series',
  imports: [MatIconModule, PairBoxes, QuantityOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './superheat-series.html',
  styleUrls: ['./segments.scss', './superheat-series.scss'],
})
export class SuperheatSeries {
  readonly step = input.required<SuperheatStep>();
  readonly facts = input.required<SequenceFacts>();
  readonly how = input.required<ReadHow>();
  readonly observation = model.required<TypedObservation>();

  private readonly nowMs = inject(NOW_MS);
  private readonly chosen = signal<number | null>(null);
  protected readonly rows = computed(() => this.observation().readings);
  /** The row with its boxes open: the one that was tapped, else the last. */
  protected readonly openRow = computed(() => this.chosen() ?? this.rows().length - 1);
  protected readonly canRead = computed(() => this.rows().length < MOST_READINGS);
  protected readonly superheats = computed(() =>
    this.rows().map((row) => livePair(row, this.step(), this.facts(), this.how()).superheatK),
  );

  protected open(index: number): void {
    this.chosen.set(index);
  }

  protected readNow(): void {
    this.observation.set(withReading(this.observation(), this.nowMs()));
    this.chosen.set(null);
  }

  protected changePair(index: number, pair: TypedPair): void {
    this.change(index, pair);
  }

  protected changeSince(index: number, event: Event): void {
    this.change(index, { since: (event.target as HTMLInputElement).value });
  }

  protected remove(index: number): void {
    const readings = this.rows().filter((_row, at) => at !== index);
    // Without a reading the next one is the first again, and begins the count.
    const seriesFrom = readings.length === 0 ? null : this.observation().seriesFrom;
    this.observation.set({ ...this.observation(), readings, seriesFrom });
    this.chosen.set(null);
  }

  protected isTimeOdd(row: TypedReading): boolean {
    return readSince(row.since) === null;
  }

  private change(index: number, change: Partial<TypedReading>): void {
    const readings = this.rows().map((row, at) => (at === index ? { ...row, ...change } : row));
    this.observation.set({ ...this.observation(), readings });
  }
}
