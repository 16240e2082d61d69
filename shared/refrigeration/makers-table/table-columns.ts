import { parseUnit } from '../../units/parse-unit';
import { UNITS, type Dimension, type UnitId } from '../../units/unit';

/** Units in which a sheet is printed. */
export interface MakersTableUnits {
  /** A unit of temperature. */
  readonly temperature: UnitId;
  /** A unit of gauge or absolute pressure; gauge means above the standard atmosphere at sea level. */
  readonly pressure: UnitId;
}

/** Where the three figures stand in a row, and in which units. */
export interface TableColumns {
  readonly temperature: number;
  readonly bubble: number;
  /** The same as `bubble` where a pure refrigerant has one pressure. */
  readonly dew: number;
  readonly units: MakersTableUnits;
}

export type ColumnProblemCode = 'columnsUnknown' | 'headingUnitsDiffer' | 'tooManyColumns' | 'tooFewColumns';

export type ColumnsResult =
  | { readonly ok: true; readonly columns: TableColumns }
  | { readonly ok: false; readonly reason: ColumnProblemCode };

// Words of printed tables in English and Spanish, as parts of a heading.
const TEMPERATURE = /temp/i;
const BUBBLE = /bubble|liq|burbuja|l[ií]quido/i;
const DEW = /dew|vap|roc[ií]o|gas/i;
const PRESSURE = /press|presi|psi|bar|pa\b/i;

/** Every unit of the dimensions that a heading's parts name: "Dew (psig)", "Presión, bar". */
function unitsNamed(heading: string, dimensions: readonly Dimension[]): UnitId[] {
  const bracketed = [...heading.matchAll(/[([]([^)\]]+)[)\]]/g)].map(([, inside]) => inside ?? '');
  const words = heading.split(/[\s,/:]+/).slice(1);
  for (const text of [...bracketed, heading, ...words]) {
    const units = dimensions
      .map((dimension) => parseUnit(text, dimension))
      .filter((unit) => unit !== undefined);
    if (units.length > 0) return units;
  }
  return [];
}

const PRESSURES: readonly Dimension[] = ['gaugePressure', 'absolutePressure'];

/** The unit that headings name; the given one where they name none or leave gauge or absolute open; null where they differ. */
function unitOf(headings: readonly string[], dimensions: readonly Dimension[], given: UnitId): UnitId | null {
  const named = headings
    .map((heading) => unitsNamed(heading, dimensions))
    .filter((units) => units.length > 0);
  const [first] = named;
  if (first === undefined) return given;
  const common = first.filter((unit) => named.every((units) => units.includes(unit)));
  if (common.includes(given)) return given;
  return common[0] ?? null;
}

const indexWhere = (headings: readonly string[], test: (heading: string) => boolean): number | null => {
  const index = headings.findIndex(test);
  return index < 0 ? null : index;
};

/** Columns by what their headings say; undefined where they don't say. */
function placesBy(headings: readonly string[]): Omit<TableColumns, 'units'> | undefined {
  const isTemperature = (heading: string): boolean =>
    TEMPERATURE.test(heading) || unitsNamed(heading, ['temperature']).length > 0;
  const temperature =
    indexWhere(
      headings,
      (heading) => TEMPERATURE.test(heading) && !BUBBLE.test(heading) && !DEW.test(heading),
    ) ?? indexWhere(headings, isTemperature);
  const bubble = indexWhere(headings, (heading) => BUBBLE.test(heading) && !isTemperature(heading));
  const dew = indexWhere(headings, (heading) => DEW.test(heading) && !isTemperature(heading));
  if (temperature === null) return undefined;
  if (bubble !== null && dew !== null && bubble !== dew) return { temperature, bubble, dew };
  const [only, ...more] = headings.flatMap((heading, index) =>
    index !== temperature && (PRESSURE.test(heading) || BUBBLE.test(heading) || DEW.test(heading))
      ? [index]
      : [],
  );
  if (only === undefined || more.length > 0) return undefined;
  return { temperature, bubble: only, dew: only };
}

/** Temperature, bubble, dew in this order, or temperature and one pressure. */
function placesByOrder(width: number): Omit<TableColumns, 'units'> | ColumnProblemCode {
  if (width < 2) return 'tooFewColumns';
  if (width > 3) return 'tooManyColumns';
  return { temperature: 0, bubble: 1, dew: width - 1 };
}

/**
 * Finds temperature, bubble and dew in a table, by its headings or, without any, by the usual order.
 *
 * @param headings cells of the heading row; null when there is none
 * @param width number of columns
 * @param given units to go by where the headings name none, or "psi" without saying gauge or absolute
 * @returns places and units, or why they can't be told
 * @example findColumns(['Temp (°F)', 'Dew (psig)', 'Bubble (psig)'], 3, given) // { temperature: 0, bubble: 2, dew: 1, … }
 */
export function findColumns(
  headings: readonly string[] | null,
  width: number,
  given: MakersTableUnits,
): ColumnsResult {
  const found = headings === null ? placesByOrder(width) : (placesBy(headings) ?? 'columnsUnknown');
  if (typeof found === 'string') return { ok: false, reason: found };
  const named = (index: number): string => headings?.[index] ?? '';
  const temperature = unitOf([named(found.temperature)], ['temperature'], given.temperature);
  const pressure = unitOf([named(found.bubble), named(found.dew)], PRESSURES, given.pressure);
  if (temperature === null || pressure === null) return { ok: false, reason: 'headingUnitsDiffer' };
  return { ok: true, columns: { ...found, units: { temperature, pressure } } };
}

export const isGauge = (unit: UnitId): boolean => UNITS[unit].dimension === 'gaugePressure';
