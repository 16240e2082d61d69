import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { TranslocoDirective, TranslocoService } from '@jsverse/transloco';
import type { MakersTableFacts } from '#shared/checklist/facts';
import type { MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import type { SaturationTable } from '#shared/refrigeration/saturation/saturation-table';
import { formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import { readingLanguage } from '../ui/words/reading-language';
import { drawCurve, HEIGHT, SCALES, WIDTH, type Scale } from './curve-drawing';
import { absoluteUnit } from './sheet-units';
import { isPure } from './sheet-reading';

/** A sheet as a drawing: bubble and dew pressure over temperature, one dot for each printed row. */
@Component({
  selector: 'app-sheet-curve',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './sheet-curve.html',
  styleUrl: './sheet-curve.scss',
})
export class SheetCurve {
  readonly table = input.required<Pick<MakersTableFacts, 'designation' | 'points'>>();
  /** What results are worked out with; null while something is refused. */
  readonly saturation = input.required<SaturationTable | null>();
  readonly units = input.required<MakersTableUnits>();
  /** Rows that something is said about, counted from 1. */
  readonly named = input<ReadonlySet<number>>(new Set());

  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  protected readonly scales = SCALES;
  protected readonly scale = signal<Scale>('logarithmic');
  protected readonly view = `0 0 ${WIDTH} ${HEIGHT}`;
  protected readonly drawing = computed(() =>
    drawCurve(this.table().points, this.saturation(), this.units(), this.scale(), this.named()),
  );
  protected readonly isPure = computed(() => isPure(this.table()));
  protected readonly temperatureUnit = computed(() => UNITS[this.units().temperature].symbol);
  protected readonly pressureUnit = computed(() => UNITS[absoluteUnit(this.units().pressure)].symbol);
  /** The drawing in a sentence. */
  protected readonly description = computed(() => {
    const language = this.language();
    const { points, designation } = this.table();
    const [first, last] = [points[0], points.at(-1)];
    const temperature = (si: number | undefined) =>
      formatQuantity(si ?? NaN, this.units().temperature, language);
    const pressure = (si: number | undefined) =>
      formatQuantity(si ?? NaN, absoluteUnit(this.units().pressure), language);
    return this.words.translate<string>(
      this.isPure() ? 'refrigerants.curvePure' : 'refrigerants.curveBoth',
      {
        designation: designation || '–',
        count: points.length,
        coldest: temperature(first?.temperatureK),
        warmest: temperature(last?.temperatureK),
        dewLow: pressure(first?.dewPa),
        dewHigh: pressure(last?.dewPa),
        bubbleLow: pressure(first?.bubblePa),
        bubbleHigh: pressure(last?.bubblePa),
      },
      language,
    );
  });
}
