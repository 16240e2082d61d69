import { Pipe, type PipeTransform } from '@angular/core';
import { fromSi } from '#shared/units/convert';
import { formatNumber, formatQuantity } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';
import type { Dimension } from '#shared/units/unit';
import { displayUnitFor, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from './words/reading-language';

/** A stored SI value in the opening's units with its symbol; an em dash for a value that isn't there. */
@Pipe({ name: 'appQuantity', pure: false })
export class QuantityOf implements PipeTransform {
  private readonly language = readingLanguage();

  /**
   * @param si in the SI unit of `dimension`
   * @param decimals where the value isn't known as closely as the unit is shown: an elevation in whole feet
   */
  transform(
    si: number | null | undefined,
    dimension: Dimension,
    unitSystem: UnitSystem,
    decimals?: number,
  ): string {
    const unit = displayUnitFor(si ?? 0, dimension, unitSystem);
    if (si === null || si === undefined || decimals === undefined) {
      return formatQuantity(si ?? Number.NaN, unit, this.language());
    }
    return `${formatNumber(fromSi(si, unit), decimals, this.language())} ${UNITS[unit].symbol}`.trim();
  }
}
