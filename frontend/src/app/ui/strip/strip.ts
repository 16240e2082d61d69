import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Dimension } from '#shared/units/unit';
import { formatQuantity } from '#shared/units/format';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from '../words/reading-language';
import { drawStrip } from './strip-drawing';

/**
 * A reading against its limits: the target as a channel in a ruled bar, a wedge for the value, a bracket for the low and
 * the high of a hunting valve, and an arrow only when there is a way to go. A sentence says the same to a screen reader.
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
    }),
  );

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

  protected percent(fraction: number): string {
    return `${(fraction * 100).toFixed(2)}%`;
  }
}
