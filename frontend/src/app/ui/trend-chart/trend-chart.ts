import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { TrendAnswer, TrendStep } from '#shared/checklist/kinds/trend';
import { trendAnalysis } from '#shared/checklist/trend-judging';
import { LONGEST_GAP } from '#shared/refrigeration/logger/pull-down';
import { formatNumber, formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from '../words/reading-language';
import { drawTrend } from './trend-drawing';

const HOUR_S = 3600;
const MINUTE_S = 60;

/**
 * A log of temperatures over hours: the line, its band as a channel in it, the moment the band was reached, and the
 * longest time above it afterwards. The same in sentences below it, which a screen reader gets for the drawing.
 */
@Component({
  selector: 'app-trend-chart',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trend-chart.html',
  styleUrl: './trend-chart.scss',
})
export class TrendChart {
  readonly step = input.required<TrendStep>();
  readonly answer = input.required<TrendAnswer>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly label = input.required<string>();

  private readonly language = readingLanguage();
  private readonly unit = computed(() => displayUnit('temperature', this.unitSystem()));
  private readonly band = computed(() => ({ lowK: this.step().bandLowK, highK: this.step().bandHighK }));

  protected readonly symbol = computed(() => UNITS[this.unit()].symbol);
  protected readonly drawing = computed(() =>
    drawTrend(this.answer(), this.band(), this.unit(), LONGEST_GAP),
  );
  protected readonly marks = computed(() => {
    const result = trendAnalysis(this.step(), this.answer());
    return result.ok ? result : null;
  });
  protected readonly lasted = computed(() => {
    const { atS } = this.answer();
    return this.time((atS.at(-1) ?? NaN) - (atS[0] ?? NaN));
  });

  protected readonly limits = computed(() => ({
    key: this.step().bandLowK === null ? 'strip_limitsHigh' : 'strip_limitsLowHigh',
    low: this.temperature(this.step().bandLowK ?? NaN),
    high: this.temperature(this.step().bandHighK),
  }));

  protected temperature(kelvins: number): string {
    return formatQuantity(kelvins, this.unit(), this.language());
  }

  protected hours(seconds: number): string {
    return formatQuantity(seconds, 'h', this.language());
  }

  /** A duration: hours from two on, minutes from two on, else seconds. */
  protected time(seconds: number): string {
    const unit = seconds >= 2 * HOUR_S ? 'h' : seconds >= 2 * MINUTE_S ? 'min' : 's';
    return formatQuantity(seconds, unit, this.language());
  }

  /** A tick's number, with as many decimals as it has. */
  protected tick(value: number): string {
    return formatNumber(value, (String(value).split('.')[1] ?? '').length, this.language());
  }

  protected percent(share: number): string {
    return `${(share * 100).toFixed(2)}%`;
  }
}
