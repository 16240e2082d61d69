import { buildMakersTable } from '../refrigeration/makers-table/build-makers-table';
import type { MakersTable } from '../refrigeration/makers-table/makers-table';
import { findRefrigerant } from '../refrigeration/saturation/refrigerants';
import type { SaturationTable } from '../refrigeration/saturation/saturation-table';
import { kelvin, pascalAbsolute } from '../units/quantity';
import type { MakersTableFacts, SequenceFacts } from './facts';

/** Built tables by the facts that they were built from: building takes a millisecond, judging happens at every key. */
const built = new WeakMap<MakersTableFacts, SaturationTable | null>();

/** A sheet while it is being entered may lack its safety class; what is kept never does. */
type EnteredTable = Omit<MakersTableFacts, 'safetyClass'> & Partial<Pick<MakersTableFacts, 'safetyClass'>>;

/** The table as the calculations take it: the same figures with their dimensions. */
export const makersTableOf = ({ points, ...named }: EnteredTable): MakersTable => ({
  ...named,
  points: points.map(({ temperatureK, bubblePa, dewPa }) => ({
    temperature: kelvin(temperatureK),
    bubble: pascalAbsolute(bubblePa),
    dew: pascalAbsolute(dewPa),
  })),
});

/**
 * The saturation figures that a sequence is judged by: the maker's table that its opening works with, else the
 * program's own.
 *
 * @returns undefined where there are none, or where the maker's table doesn't hold together
 */
export function saturationOf(
  facts: Pick<SequenceFacts, 'refrigerant' | 'makersTable'>,
): SaturationTable | undefined {
  const { makersTable } = facts;
  if (!makersTable) return findRefrigerant(facts.refrigerant);
  const known = built.get(makersTable);
  if (known !== undefined) return known ?? undefined;
  const result = buildMakersTable(makersTableOf(makersTable));
  built.set(makersTable, result.ok ? result.table : null);
  return result.ok ? result.table : undefined;
}
