import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import type { SaturationTable } from '#shared/refrigeration/saturation/saturation-table';
import { UNITS } from '#shared/units/unit';
import { readingLanguage } from '../ui/words/reading-language';
import { checkValues } from './check-values';
import { differenceUnit, figureIn, pressureFigure } from './sheet-units';

/** A few values that the program works with, to be held against the sheet in the hand. */
@Component({
  selector: 'app-check-table',
  imports: [TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './check-table.html',
  styleUrl: './check-table.scss',
})
export class CheckTable {
  readonly saturation = input.required<SaturationTable>();
  readonly units = input.required<MakersTableUnits>();

  private readonly language = readingLanguage();
  private readonly values = computed(() => checkValues(this.saturation(), this.units().temperature));
  /** Only where the program has figures of its own. */
  protected readonly hasOwn = computed(() =>
    this.values().some(({ ownDifferenceK }) => ownDifferenceK !== null),
  );
  protected readonly rows = computed(() => {
    const language = this.language();
    const { temperature, pressure } = this.units();
    const difference = differenceUnit(temperature);
    return this.values().map((value) => ({
      temperature: figureIn(value.temperatureK, temperature, language),
      bubble: pressureFigure(value.bubblePa, pressure, language),
      dew: pressureFigure(value.dewPa, pressure, language),
      glide: figureIn(value.glideK, difference, language),
      own: figureIn(value.ownDifferenceK, difference, language),
    }));
  });
  protected readonly symbols = computed(() => {
    const { temperature, pressure } = this.units();
    return {
      temperature: UNITS[temperature].symbol,
      pressure: UNITS[pressure].symbol,
      difference: UNITS[differenceUnit(temperature)].symbol,
    };
  });
}
