import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Dimension } from '#shared/units/unit';
import { fromSi } from '#shared/units/convert';
import { decimalsFor, formatNumber, formatQuantity } from '#shared/units/format';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from '../words/reading-language';
import { drawStrip } from './strip-drawing';

/** What lies between two values of a dimension with a zero of its own. */
const DIFFERENCE_OF: Readonly<Partial<Record<Dimension, Dimension>>> = {
  temperature: 'temperatureDifference',
  gaugePressure: 'pressureDifference',
  absolutePressure: 'pressureDifference',
};

/**
 * A reading against its limits: the target as a channel in a ruled bar, a wedge for the value, a bracket for the low and
 * the high of a hunting valve, a whisker for the instruments' error, and only when there is a way to go an arrow and how far. A sentence says the same to a screen reader.
 */
@Component({
  selector: 'app-strip',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './strip.html',
  styleUrl: './strip.scss',
})
export class Strip {
  readonly low = input<number | null>(null);
  readonly high = input<number | null>(null);
  readonly value = input.required<number>();
  readonly minimum = input<number | null>(null);
  readonly maximum = input<number | null>(null);
  /** Half width of the instruments' error, in the same unit; `null` where it isn't known. */
  readonly uncertainty = input<number | null>(null);
  readonly dimension = input.required<Dimension>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly label = input.required<string>();

  private readonly language = readingLanguage();

  protected readonly drawing = computed(() =>
    drawStrip({
      low: this.low(),
      high: this.high(),
      value: this.value(),
      minimum: this.minimum(),
      maximum: this.maximum(),
      uncertainty: this.uncertainty(),
    }),
  );
  /** How far it is to the nearer edge, and which way; `null` when there is no way to go. */
  protected readonly toGo = computed(() => {
    const way = this.drawing().way;
    if (!way) return null;
    const edge = way.direction === 'up' ? this.low() : this.high();
    return { isUp: way.direction === 'up', by: Math.abs((edge ?? NaN) - this.value()) };
  });

  /** The key of the sentence and its figures; parts that don't exist are empty. */
  protected readonly sentence = computed(() => {
    const way = this.drawing().way;
    const limits = `${this.low() === null ? '' : 'Low'}${this.high() === null ? '' : 'High'}`;
    const verdict = limits === '' ? 'None' : way ? (way.direction === 'up' ? 'Below' : 'Above') : 'Within';
    return { limits: `strip_limits${limits || 'None'}`, verdict: `strip_verdict${verdict}` };
  });

  protected text(si: number | null): string {
    return si === null
      ? ''
      : formatQuantity(si, displayUnit(this.dimension(), this.unitSystem()), this.language());
  }

  /** A distance on the scale: between two temperatures lies a difference, in its own unit. */
  protected apart(si: number): string {
    const dimension = DIFFERENCE_OF[this.dimension()] ?? this.dimension();
    return formatQuantity(si, displayUnit(dimension, this.unitSystem()), this.language());
  }

  /** The value with its error, both in the one unit: "4.1 ± 1.6 °F". */
  protected withError(): string {
    const error = this.uncertainty();
    const text = this.text(this.value());
    if (error === null || this.drawing().whisker === null) return text;
    const unit = displayUnit(this.dimension(), this.unitSystem());
    const figure = formatNumber(fromSi(this.value(), unit), decimalsFor(unit), this.language());
    return `${figure} ± ${this.apart(error)}`;
  }

  protected percent(fraction: number): string {
    return `${(fraction * 100).toFixed(2)}%`;
  }
}
