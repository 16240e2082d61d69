import type { SaturationTable } from '../saturation/saturation-table';
import { likenessProblems } from './likeness';
import { FEWEST_POINTS, problem, type MakersTable, type MakersTableProblem } from './makers-table';
import { numberProblems, orderProblems, phaseProblems } from './order-problems';
import { ownFigureProblems } from './own-figures';
import { smoothnessProblems } from './smoothness';

const isBlank = (text: string): boolean => text.trim() === '';

function namingProblems({ designation, issuer, edition }: MakersTable): MakersTableProblem[] {
  return [
    ...(isBlank(designation) ? [problem('noDesignation', 'refuse')] : []),
    ...(isBlank(issuer) ? [problem('noIssuer', 'refuse')] : []),
    ...(isBlank(edition) ? [problem('noEdition', 'ask')] : []),
  ];
}

/** An outlying row makes its neighbours look as if they fell and its phases as if they crossed: it alone is named. */
function withoutEchoes(problems: readonly MakersTableProblem[], outliers: readonly MakersTableProblem[]) {
  const isEcho = ({ row, code }: MakersTableProblem): boolean =>
    outliers.some(
      (outlier) =>
        row !== null &&
        outlier.row !== null &&
        (row === outlier.row || (code === 'notRising' && row === outlier.row + 1)),
    );
  return problems.filter((found) => !isEcho(found));
}

function figureProblems(table: MakersTable, relatives: readonly SaturationTable[]): MakersTableProblem[] {
  const { points, printedStepPa } = table;
  const numbers = numberProblems(points);
  const order = orderProblems(points);
  const likeness = (rows: MakersTable['points']) => likenessProblems(rows, relatives, printedStepPa);
  if (numbers.length > 0) {
    // Pressures below zero are what gauge figures taken for absolute ones look like.
    const isAboutPressure = numbers.every(({ code }) => code === 'notPositive');
    return [...numbers, ...order, ...(isAboutPressure && order.length === 0 ? likeness(points) : [])];
  }
  const phases = phaseProblems(points);
  const outOfOrder = order.some(({ code }) => code !== 'gapTooWide');
  if (outOfOrder || points.length < FEWEST_POINTS) return [...order, ...phases.filter(isAboutColumns)];
  const outliers = smoothnessProblems(points, printedStepPa);
  const smooth = points.filter((_, index) => outliers.every(({ row }) => row !== index + 1));
  return [...order, ...withoutEchoes(phases, outliers), ...outliers, ...likeness(smooth)];
}

const isAboutColumns = ({ code }: MakersTableProblem): boolean =>
  code === 'columnsSwapped' || code === 'dewAboveBubble';

/**
 * What is wrong or odd about a maker's table before anything is worked out from it: at least 6 rows, ascending, at most
 * 10 K apart, pressures positive and rising, dew never above bubble, smooth, and behaving like a refrigerant.
 *
 * @param table as entered: kelvin and absolute pascals
 * @param relatives tables that are known to be right, usually all shipped ones; with none likeness isn't judged
 * @returns refusals and questions with row numbers and figures; empty when nothing is odd
 * @source gap: worked out, see `buildMakersTable`; the rest at the function of each check
 * @example checkMakersTable({ …, points: rows at −40, 0 and 40 °C }, []) // tooFewPoints, gapTooWide in rows 2 and 3
 */
export const checkMakersTable = (
  table: MakersTable,
  relatives: readonly SaturationTable[],
): MakersTableProblem[] => [
  ...namingProblems(table),
  ...figureProblems(table, relatives),
  ...ownFigureProblems(table),
];
