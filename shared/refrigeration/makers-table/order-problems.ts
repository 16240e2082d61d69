import {
  FEWEST_POINTS,
  problem,
  WIDEST_GAP_K,
  type MakersPoint,
  type MakersTableProblem,
  type PhaseColumn,
} from './makers-table';

const COLUMNS: readonly PhaseColumn[] = ['bubble', 'dew'];

/** Conversion noise: 18 °F are 10 K only to a dozen digits. */
const NOISE_K = 1e-6;

/** Rows next to each other, with the later one's number. */
function pairs(points: readonly MakersPoint[]): { row: number; before: MakersPoint; point: MakersPoint }[] {
  return points.slice(1).flatMap((point, index) => {
    const before = points[index];
    return before === undefined ? [] : [{ row: index + 2, before, point }];
  });
}

function numberProblem(point: MakersPoint, row: number): MakersTableProblem | null {
  const { temperature, bubble, dew } = point;
  if (![temperature, bubble, dew].every(Number.isFinite)) return problem('notFinite', 'refuse', { row });
  if (temperature <= 0) {
    const values = [{ label: 'temperature', value: temperature, unit: 'K' } as const];
    return problem('belowAbsoluteZero', 'refuse', { row, values });
  }
  const column = COLUMNS.find((name) => point[name] <= 0);
  if (column === undefined) return null;
  const values = [{ label: column, value: point[column], unit: 'Pa' } as const];
  return problem('notPositive', 'refuse', { row, column, values });
}

/**
 * Numbers that are no temperature or no absolute pressure.
 *
 * @param points in kelvin and absolute pascals
 * @returns at most one refusal a row
 */
export const numberProblems = (points: readonly MakersPoint[]): MakersTableProblem[] =>
  points.map((point, index) => numberProblem(point, index + 1)).filter((found) => found !== null);

/**
 * Rows that are out of order, repeated, too few or too far apart.
 *
 * @param points in kelvin and absolute pascals
 * @returns refusals; a table printed from warm to cold is one finding, not one a row
 */
export function orderProblems(points: readonly MakersPoint[]): MakersTableProblem[] {
  if (points.length < FEWEST_POINTS) {
    const values = [{ label: 'points', value: points.length, unit: 'count' } as const];
    return [problem('tooFewPoints', 'refuse', { values }), ...stepProblems(points)];
  }
  const steps = pairs(points);
  if (steps.every(({ before, point }) => point.temperature < before.temperature))
    return [problem('descending', 'refuse')];
  return stepProblems(points);
}

function stepProblems(points: readonly MakersPoint[]): MakersTableProblem[] {
  return pairs(points).flatMap(({ row, before, point }) => {
    const step = point.temperature - before.temperature;
    const values = [
      { label: 'temperatureBefore', value: before.temperature, unit: 'K' },
      { label: 'temperature', value: point.temperature, unit: 'K' },
      { label: 'step', value: step, unit: 'K_diff' },
    ] as const;
    if (Math.abs(step) <= NOISE_K) return [problem('repeatedTemperature', 'refuse', { row, values })];
    if (step < 0) return [problem('notAscending', 'refuse', { row, values })];
    return step > WIDEST_GAP_K + NOISE_K ? [problem('gapTooWide', 'refuse', { row, values })] : [];
  });
}

/**
 * Rows whose pressure doesn't rise, and dew pressures above the bubble pressure.
 *
 * @param points in kelvin and absolute pascals, ascending in temperature
 * @returns refusals; when the dew pressure is the higher one wherever the two differ, the columns are swapped, once
 */
export function phaseProblems(points: readonly MakersPoint[]): MakersTableProblem[] {
  const falling = pairs(points).flatMap(({ row, before, point }) =>
    COLUMNS.filter((column) => !(point[column] > before[column])).map((column) => {
      const values = [
        { label: 'pressureBefore', value: before[column], unit: 'Pa' },
        { label: 'pressure', value: point[column], unit: 'Pa' },
      ] as const;
      return problem('notRising', 'refuse', { row, column, values });
    }),
  );
  return [...falling, ...crossingProblems(points)];
}

function crossingProblems(points: readonly MakersPoint[]): MakersTableProblem[] {
  const above = points.filter(({ bubble, dew }) => dew > bubble).length;
  const below = points.filter(({ bubble, dew }) => dew < bubble).length;
  // One mistyped row must not hide that the rest of the columns are swapped.
  if (above > 2 && below <= above / 4) return [problem('columnsSwapped', 'refuse')];
  return points.flatMap(({ bubble, dew }, index) => {
    if (dew <= bubble) return [];
    const values = [
      { label: 'bubble', value: bubble, unit: 'Pa' },
      { label: 'dew', value: dew, unit: 'Pa' },
    ] as const;
    return [problem('dewAboveBubble', 'refuse', { row: index + 1, column: 'dew', values })];
  });
}
