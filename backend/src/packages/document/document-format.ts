import type { TypedValue } from '#shared/checklist/typed-value';
import type { Language } from '#shared/checklist/text';
import { fromSi, toSi } from '#shared/units/convert';
import { decimalsFor, formatNumber, formatQuantity } from '#shared/units/format';
import { parseNumber } from '#shared/units/parse-number';
import { roundTo } from '#shared/units/round';
import { UNITS, type Dimension, type UnitId } from '#shared/units/unit';
import { displayUnit, displayUnitFor, type UnitSystem } from '#shared/units/unit-system';
import type { DocumentWords } from './document-words';

const LOCALES: Readonly<Record<Language, string>> = { en: 'en-US', es: 'es-US' };

/** Writes numbers, units, dates and times for one opening and one language. */
export class DocumentFormat {
  private readonly times: Intl.DateTimeFormat;
  private readonly days: Intl.DateTimeFormat;

  constructor(
    private readonly language: Language,
    private readonly unitSystem: UnitSystem,
    timeZone: string,
    private readonly words: DocumentWords,
  ) {
    this.times = timeFormat(LOCALES[language], timeZone);
    this.days = new Intl.DateTimeFormat(LOCALES[language], { dateStyle: 'long', timeZone: 'UTC' });
  }

  /** A figure with its own unit, in the opening's unit for it. */
  quantity(value: number, unit: UnitId): string {
    return this.ofDimension(toSi(value, unit), UNITS[unit].dimension);
  }

  /** A value in the SI unit of a dimension, in the opening's unit for it. */
  ofDimension(siValue: number, dimension: Dimension): string {
    return formatQuantity(siValue, displayUnitFor(siValue, dimension, this.unitSystem), this.language);
  }

  /** A length in whole feet or metres: an elevation isn't known any closer. */
  wholeLength(metres: number): string {
    const unit = displayUnit('length', this.unitSystem);
    return `${formatNumber(fromSi(metres, unit), 0, this.language)} ${UNITS[unit].symbol}`;
  }

  /** A number exactly as somebody typed it. */
  typed(value: TypedValue): string {
    return `${value.text} ${UNITS[value.unit].symbol}`.trim();
  }

  /** Whether the value printed in the opening's unit is the very number that was typed. */
  showsAsTyped(value: TypedValue): boolean {
    const { unit } = value;
    if (displayUnit(UNITS[unit].dimension, this.unitSystem) !== unit) return false;
    const parsed = parseNumber(value.text);
    return parsed.ok && roundTo(parsed.value, decimalsFor(unit)) === parsed.value;
  }

  /** Limits in words; an empty string when there are none. */
  range(low: number | null, high: number | null, dimension: Dimension): string {
    const { between, atLeast, atMost } = this.words.limits;
    if (low !== null && high !== null) {
      const unit = displayUnitFor(high, dimension, this.unitSystem);
      // The unit stands once, behind the second number.
      const lowNumber = formatNumber(fromSi(low, unit), decimalsFor(unit), this.language);
      return between(lowNumber, this.ofDimension(high, dimension));
    }
    if (low !== null) return atLeast(this.ofDimension(low, dimension));
    return high === null ? '' : atMost(this.ofDimension(high, dimension));
  }

  /** Date and time of day in the opening's time zone, which it names. */
  dateTime(iso: string): string {
    return this.times.format(new Date(iso));
  }

  /** A calendar day, which has no time zone. */
  day(isoDate: string): string {
    const date = new Date(`${isoDate}T00:00:00Z`);
    return Number.isNaN(date.getTime()) ? isoDate : this.days.format(date);
  }
}

function timeFormat(locale: string, timeZone: string): Intl.DateTimeFormat {
  const shape: Intl.DateTimeFormatOptions = {
    year: 'numeric',
    month: 'short',
    day: 'numeric',
    hour: 'numeric',
    minute: '2-digit',
    timeZoneName: 'short',
  };
  try {
    return new Intl.DateTimeFormat(locale, { ...shape, timeZone });
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    // A time zone that this machine doesn't know: the times still say which one they are in.
    return new Intl.DateTimeFormat(locale, { ...shape, timeZone: 'UTC' });
  }
}
