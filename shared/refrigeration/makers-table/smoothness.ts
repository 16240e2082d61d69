import {
  problem,
  USUAL_PRINTED_STEP_PA,
  type MakersPoint,
  type MakersTableProblem,
  type PhaseColumn,
} from './makers-table';

/** Logarithm of one column over the inverse temperature, with the row numbers that are still in. */
interface Series {
  readonly rows: readonly number[];
  readonly xs: readonly number[];
  readonly ys: readonly number[];
  /** Half the last printed digit, relative to each pressure. */
  readonly rounding: readonly number[];
}

interface Outlier {
  readonly row: number;
  readonly expectedPa: number;
}

/**
 * What a row's ln p may differ from its neighbours' cubic beyond rounding: 0.3 % of the pressure, about 0.1 K. Equations of
 * state stay eight times below it on 10 K rows up to 5 K below the critical point (worked out from the shipped tables).
 */
const SCATTER = 0.003;

/** Rows that a cubic runs through. */
const NEIGHBOURS = 4;

/** More than this many contradicted rows are no typing errors any more. */
const MOST_OUTLIERS = 3;

function seriesOf(points: readonly MakersPoint[], column: PhaseColumn, stepPa: number): Series {
  return {
    rows: points.map((_, index) => index + 1),
    xs: points.map(({ temperature }) => 1 / temperature),
    ys: points.map((point) => Math.log(point[column])),
    rounding: points.map((point) => stepPa / 2 / point[column]),
  };
}

const without = (series: Series, index: number): Series => ({
  rows: series.rows.filter((_, other) => other !== index),
  xs: series.xs.filter((_, other) => other !== index),
  ys: series.ys.filter((_, other) => other !== index),
  rounding: series.rounding.filter((_, other) => other !== index),
});

/** The four rows nearest by position, the row itself left out. */
function nearestRows(count: number, index: number): number[] {
  const first = Math.min(Math.max(index - NEIGHBOURS / 2, 0), count - NEIGHBOURS - 1);
  const window = Array.from({ length: NEIGHBOURS + 1 }, (_, place) => first + place);
  return window.filter((row) => row !== index);
}

/** What the cubic through the nearest rows says at a row, and how far the row is off in units of what is allowed. */
function judgeRow({ xs, ys, rounding }: Series, index: number): { expected: number; excess: number } {
  const nearest = nearestRows(xs.length, index);
  const at = (values: readonly number[], row: number): number => values[row] ?? NaN;
  let expected = 0;
  let amplified = 1;
  let rounded = at(rounding, index) ** 2;
  for (const row of nearest) {
    let weight = 1;
    for (const other of nearest)
      if (other !== row) weight *= (at(xs, index) - at(xs, other)) / (at(xs, row) - at(xs, other));
    expected += weight * at(ys, row);
    amplified += weight ** 2;
    rounded += (weight * at(rounding, row)) ** 2;
  }
  // A row at the end is predicted from one side only, which multiplies its neighbours' scatter: it is allowed more.
  const allowed = SCATTER * Math.sqrt(amplified) + 2 * Math.sqrt(rounded);
  return { expected, excess: Math.abs(at(ys, index) - expected) / allowed };
}

const excesses = (series: Series): number[] =>
  [...series.rows.keys()].map((index) => judgeRow(series, index).excess);

/**
 * The row to blame, or null when all are within what is allowed. A wrong row also spoils what is expected of its
 * neighbours, at the ends even more than itself: the culprit is the one without which the others agree best.
 */
function culpritOf(series: Series): number | null {
  const off = excesses(series).flatMap((excess, index) => (excess > 1 ? [index] : []));
  let culprit: number | null = null;
  let least = Infinity;
  for (const index of series.rows.keys()) {
    if (!off.some((other) => Math.abs(other - index) <= NEIGHBOURS)) continue;
    const left = excesses(without(series, index)).reduce((sum, excess) => sum + excess ** 2, 0);
    if (left < least) [culprit, least] = [index, left];
  }
  return culprit;
}

/** Takes out the row to blame until the rest is smooth; null when that never comes. */
function outliersOf(series: Series): Outlier[] | null {
  const found: Outlier[] = [];
  let rest = series;
  for (;;) {
    const culprit = culpritOf(rest);
    if (culprit === null) return found;
    if (found.length === MOST_OUTLIERS || rest.rows.length <= NEIGHBOURS + 1) return null;
    const { expected } = judgeRow(rest, culprit);
    found.push({ row: rest.rows[culprit] ?? NaN, expectedPa: Math.exp(expected) });
    rest = without(rest, culprit);
  }
}

function describeOutlier(
  points: readonly MakersPoint[],
  row: number,
  found: Readonly<Record<PhaseColumn, Outlier | undefined>>,
): MakersTableProblem {
  const { bubble, dew } = found;
  const columns = (['bubble', 'dew'] as const).filter((column) => found[column] !== undefined);
  const values = columns.flatMap((column) => [
    { label: column, value: points[row - 1]?.[column] ?? NaN, unit: 'Pa' } as const,
    { label: `${column}Expected`, value: found[column]?.expectedPa ?? NaN, unit: 'Pa' } as const,
  ]);
  const column = bubble !== undefined && dew !== undefined ? 'both' : (columns[0] ?? null);
  return problem('outlyingPoint', 'refuse', { row, column, values });
}

/**
 * Rows that break an otherwise smooth table, such as 32.8 typed for 23.8: each row is held against the cubic of ln p over
 * 1/T through its four nearest neighbours.
 *
 * @param points ascending, all of them positive, at least `FEWEST_POINTS`
 * @param printedStepPa last printed digit of the pressures in pascals; coarse printing is no error
 * @returns one refusal for each such row with what its neighbours expect there; `notSmooth` when more than three are off
 * @source method and limits: worked out from the shipped tables, see the spec; no publication
 */
export function smoothnessProblems(
  points: readonly MakersPoint[],
  printedStepPa: number = USUAL_PRINTED_STEP_PA,
): MakersTableProblem[] {
  const bubble = outliersOf(seriesOf(points, 'bubble', printedStepPa));
  const dew = outliersOf(seriesOf(points, 'dew', printedStepPa));
  if (bubble === null || dew === null) {
    const column = bubble === null && dew === null ? 'both' : bubble === null ? 'bubble' : 'dew';
    return [problem('notSmooth', 'refuse', { column })];
  }
  const rows = [...new Set([...bubble, ...dew].map(({ row }) => row))].sort((a, b) => a - b);
  return rows.map((row) =>
    describeOutlier(points, row, {
      bubble: bubble.find((outlier) => outlier.row === row),
      dew: dew.find((outlier) => outlier.row === row),
    }),
  );
}
