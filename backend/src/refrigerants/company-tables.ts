import type { MakersTableFacts } from '#shared/checklist/facts';
import { findRefrigerant, refrigerantKey } from '#shared/refrigeration/saturation/refrigerants';

/** The makers' tables that a company works with, by `refrigerantKey`. */
export type CompanyTables = ReadonlyMap<string, MakersTableFacts>;

/** The table of a refrigerant, however it is written; undefined where the company has none. */
export const tableOf = (tables: CompanyTables, refrigerant: string): MakersTableFacts | undefined =>
  tables.get(refrigerantKey(refrigerant));

/**
 * The designation that a text names: of a refrigerant that the company has a table of, or that the program knows.
 *
 * @returns undefined where there is no saturation table by either
 */
export const designationKnownTo =
  (tables: CompanyTables) =>
  (text: string): string | undefined =>
    tableOf(tables, text)?.designation ?? findRefrigerant(text)?.designation;
