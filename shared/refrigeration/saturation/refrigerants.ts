import { R_1234YF } from './data/r-1234yf';
import { R_1234ZE_E } from './data/r-1234ze-e';
import { R_134A } from './data/r-134a';
import { R_22 } from './data/r-22';
import { R_290 } from './data/r-290';
import { R_32 } from './data/r-32';
import { R_404A } from './data/r-404a';
import { R_407A } from './data/r-407a';
import { R_407C } from './data/r-407c';
import { R_407F } from './data/r-407f';
import { R_410A } from './data/r-410a';
import { R_448A } from './data/r-448a';
import { R_449A } from './data/r-449a';
import { R_507A } from './data/r-507a';
import { R_744 } from './data/r-744';
import type { SaturationTable } from './saturation-table';

const TABLES: readonly SaturationTable[] = [
  R_22,
  R_32,
  R_134A,
  R_290,
  R_404A,
  R_407A,
  R_407C,
  R_407F,
  R_410A,
  R_448A,
  R_449A,
  R_507A,
  R_744,
  R_1234YF,
  R_1234ZE_E,
];

/**
 * The refrigerants whose saturation is known well enough to judge by, under their designation, in ascending order. A
 * refrigerant that is absent has to come with its maker's own table.
 */
export const REFRIGERANTS: ReadonlyMap<string, SaturationTable> = new Map(
  TABLES.map((table) => [table.designation, table]),
);

/** Upper case letters and digits only, without the leading R of a number. */
const simplify = (text: string): string =>
  text
    .toUpperCase()
    .replace(/[^A-Z0-9]/g, '')
    .replace(/^R(?=\d)/, '');

const TABLES_BY_NAME: ReadonlyMap<string, SaturationTable> = new Map(
  TABLES.flatMap((table) => [table.designation, ...table.names].map((name) => [simplify(name), table])),
);

/**
 * The refrigerant that a schedule or a person names: "R-448A", "r448a", "448A", "CO2", "propane". Never a nearest
 * match: "R-404" is not R-404A.
 *
 * @param text as written
 * @returns the table, or undefined when the refrigerant is unknown or its figures are not good enough to ship
 */
export const findRefrigerant = (text: string): SaturationTable | undefined =>
  TABLES_BY_NAME.get(simplify(text));

/**
 * What all ways of writing one refrigerant have in common, known to the program or not: by it a table is looked up.
 *
 * @param text as written
 * @returns upper case letters and digits; empty where the text has none
 * @example refrigerantKey('CO2') // '744', as of 'R-744'
 */
export const refrigerantKey = (text: string): string => simplify(findRefrigerant(text)?.designation ?? text);
