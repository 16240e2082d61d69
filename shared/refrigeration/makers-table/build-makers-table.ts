import { toSi } from '../../units/convert';
import type { SaturationTable } from '../saturation/saturation-table';
import { checkMakersTable } from './check-makers-table';
import type { MakersPoint, MakersTable, MakersTableProblem, PhaseColumn } from './makers-table';
import { monotoneCubic } from './monotone-cubic';

export type BuiltMakersTable =
  | { readonly ok: true; readonly table: SaturationTable }
  | { readonly ok: false; readonly problems: readonly MakersTableProblem[] };

/** Rows this close are read with straight lines between them to 0.001 K. */
const FINE_STEP_K = 1;

/** As everywhere: a glide below this is none in the field. */
const SMALLEST_GLIDE_K = 0.2;

/** The printed temperatures and evenly spaced ones between them. */
function fineTemperatures(points: readonly MakersPoint[]): number[] {
  return points.flatMap(({ temperature }, index) => {
    const next = points[index + 1]?.temperature;
    if (next === undefined) return [temperature];
    const parts = Math.max(1, Math.ceil((next - temperature) / FINE_STEP_K - 1e-9));
    return Array.from({ length: parts }, (_, part) => temperature + ((next - temperature) * part) / parts);
  });
}

function finePressures(points: readonly MakersPoint[], column: PhaseColumn, temperatures: readonly number[]) {
  const printed = new Map(points.map((point) => [Number(point.temperature), Number(point[column])]));
  const curve = monotoneCubic(
    points.map(({ temperature }) => -1 / temperature),
    points.map((point) => Math.log(point[column])),
  );
  // A printed row stays as printed, to the last digit.
  return temperatures.map((temperature) => printed.get(temperature) ?? Math.exp(curve(-1 / temperature)));
}

/** Whether the row nearest to 0 °C has a glide: the pressures' ratio over the steepness of ln p. */
function hasGlide(points: readonly MakersPoint[]): boolean {
  const freezing = toSi(0, 'degC');
  const distance = ({ temperature }: MakersPoint): number => Math.abs(temperature - freezing);
  const [near, next] = points.toSorted((a, b) => distance(a) - distance(b));
  if (near === undefined || next === undefined) return false;
  const steepness = Math.log(near.dew / next.dew) / (near.temperature - next.temperature);
  return Math.log(near.bubble / near.dew) / steepness > SMALLEST_GLIDE_K;
}

/** Where the figures come from, as the designation's own text in a result's working. */
const sourceOfSheet = ({ issuer, edition }: MakersTable): string =>
  ['pressure–temperature table of ' + issuer.trim(), edition.trim()].filter((text) => text !== '').join(', ');

/**
 * A maker's table as one that `dewTemperature` and the others read. Between the printed rows ln p follows a monotone cubic
 * over 1/T, laid down in steps of at most 1 K; printed rows stay as printed; nothing is answered beyond the first and the
 * last row. Keep the result: what reading it takes is worked out once for each object.
 *
 * Accuracy of the interpolation on exact rows 10 K apart: 0.03 K (the shipped tables thinned and rebuilt, up to 5 K below
 * the critical point); rounding of the printed pressures comes on top.
 *
 * @param table as entered: kelvin and absolute pascals
 * @returns the table, or every refusal that `checkMakersTable` has; questions don't stand in the way
 * @range from the first row to the last; the last row is not the critical point, which stays unknown
 * @source the sheet itself, named in `source`; cubic: Fritsch & Carlson (1980), see `monotoneCubic`
 * @example buildMakersTable({ designation: 'R-454C', issuer: 'the maker', edition: '2024-03', points }) // .table.source
 */
export function buildMakersTable(table: MakersTable): BuiltMakersTable {
  const problems = checkMakersTable(table, []).filter(({ severity }) => severity === 'refuse');
  const first = table.points[0];
  const last = table.points.at(-1);
  if (problems.length > 0 || first === undefined || last === undefined) return { ok: false, problems };
  const temperaturesK = fineTemperatures(table.points);
  return {
    ok: true,
    table: {
      designation: table.designation.trim(),
      names: [],
      composition: [],
      model: 'printed table, monotone cubic of ln p over 1/T between its rows',
      source: sourceOfSheet(table),
      reference: `${table.points.length} printed rows, entered by hand`,
      criticalK: null,
      criticalPa: null,
      lowerLimitK: first.temperature,
      upperLimitK: last.temperature,
      temperaturesK,
      bubblePa: finePressures(table.points, 'bubble', temperaturesK),
      dewPa: finePressures(table.points, 'dew', temperaturesK),
      glide: hasGlide(table.points),
      safetyClass: table.safetyClass ?? null,
      limitNote: {
        en: 'From the refrigerant maker’s own table as it was entered for this job; its figures were checked for order and smoothness only.',
        es: 'De la propia tabla del fabricante del refrigerante, tal como se introdujo para esta obra; solo se comprobó que sus cifras sean ordenadas y continuas.',
      },
    },
  };
}
