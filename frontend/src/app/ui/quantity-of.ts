import { Pipe, type PipeTransform } from '@angular/core';
import { formatQuantity } from '#shared/units/format';
import type { Dimension } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from './words/reading-language';

/** A stored SI value in the opening's units with its symbol; an em dash for a value that isn't there. */
@Pipe({ name: 'appQuantity', pure: false })
export class QuantityOf implements PipeTransform {
  private readonly language = readingLanguage();

  /** @param si in the SI unit of `dimension` */
  transform(si: number | null | undefined, dimension: Dimension, unitSystem: UnitSystem): string {
    return formatQuantity(si ?? Number.NaN, displayUnit(dimension, unitSystem), this.language());
  }
}
