import { SEA_LEVEL_ATMOSPHERE, toGauge } from '#shared/refrigeration/gauge-pressure';
import { isGauge, type MakersTableUnits } from '#shared/refrigeration/makers-table/table-columns';
import { fromSi } from '#shared/units/convert';
import { decimalsFor, formatNumber, formatQuantity, type NumberLocale } from '#shared/units/format';
import { pascalAbsolute } from '#shared/units/quantity';
import type { UnitId } from '#shared/units/unit';
import type { UnitSystem } from '#shared/units/unit-system';

/** Units in which sheets are printed; headings may name others. */
export const SHEET_TEMPERATURES = ['degF', 'degC'] as const satisfies readonly UnitId[];
export const SHEET_PRESSURES = [
  'psig',
  'psia',
  'barg',
  'bara',
  'kPag',
  'kPaa',
] as const satisfies readonly UnitId[];

/** In which units a kept sheet is shown. */
export const UNITS_OF_SYSTEM: Readonly<Record<UnitSystem, MakersTableUnits>> = {
  us: { temperature: 'degF', pressure: 'psig' },
  si: { temperature: 'degC', pressure: 'barg' },
};

const ABSOLUTE: Partial<Readonly<Record<UnitId, UnitId>>> = { psig: 'psia', barg: 'bara', kPag: 'kPaa' };

/** The absolute unit beside a gauge unit: a logarithm knows no pressure below zero. */
export const absoluteUnit = (unit: UnitId): UnitId => ABSOLUTE[unit] ?? unit;

/** A gauge unit means above the standard atmosphere at sea level, for which sheets are printed. */
const readIn = (pressurePa: number, unit: UnitId): number =>
  isGauge(unit) ? toGauge(pascalAbsolute(pressurePa), SEA_LEVEL_ATMOSPHERE) : pressurePa;

/** An absolute pressure as a sheet in this unit would print it, with the unit. */
export const pressureInWords = (pressurePa: number, unit: UnitId, language: NumberLocale): string =>
  formatQuantity(readIn(pressurePa, unit), unit, language);

/** The same under a heading that names the unit. */
export const pressureFigure = (pressurePa: number, unit: UnitId, language: NumberLocale): string =>
  figureIn(readIn(pressurePa, unit), unit, language);

/** A stored quantity as a bare number, under a heading that names the unit; an em dash where there is none. */
export const figureIn = (si: number | null, unit: UnitId, language: NumberLocale): string =>
  formatNumber(fromSi(si ?? NaN, unit), decimalsFor(unit), language);

/** The unit of a difference beside a unit of temperature. */
export const differenceUnit = (temperature: UnitId): UnitId =>
  temperature === 'degF' ? 'degF_diff' : 'K_diff';
