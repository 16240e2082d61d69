import { bubbleTemperature, dewTemperature } from '../saturation/saturation-curve';
import { findRefrigerant } from '../saturation/refrigerants';
import { problem, type MakersTable, type MakersTableProblem } from './makers-table';

/**
 * Makers' sheets and the program's figures of one refrigerant agree within this; the worst that was found among published
 * tables is 0.34 K (R-448A). Twice that and more is another refrigerant, another unit or a slip.
 */
const ALIKE_K = 1;

/**
 * Where the program has figures of the very same refrigerant, a sheet that says something else is asked about: it would take
 * their place.
 *
 * @param table as entered
 * @returns one question with the largest difference in kelvin and its row, or nothing
 */
export function ownFigureProblems({ designation, points }: MakersTable): MakersTableProblem[] {
  const own = findRefrigerant(designation);
  if (!own) return [];
  let worst = { row: 0, differenceK: 0, column: 'dew' as 'dew' | 'bubble' };
  points.forEach((point, index) => {
    for (const column of ['dew', 'bubble'] as const) {
      const read = column === 'dew' ? dewTemperature(own, point.dew) : bubbleTemperature(own, point.bubble);
      const differenceK = read.ok ? point.temperature - read.temperature : 0;
      if (Math.abs(differenceK) > Math.abs(worst.differenceK))
        worst = { row: index + 1, differenceK, column };
    }
  });
  if (Math.abs(worst.differenceK) <= ALIKE_K) return [];
  const values = [{ label: 'differenceFromOwn', value: worst.differenceK, unit: 'K_diff' as const }];
  return [problem('differsFromOwn', 'ask', { row: worst.row, column: worst.column, values })];
}
