import type { CircuitRow } from '#shared/contracts/openings';

/** A circuit as this phone sees it: the server's row, overtaken by what was recorded here and isn't there yet. */
export interface WorkRow extends CircuitRow {
  readonly unsentCount: number;
}

export interface AreaGroup {
  readonly area: string;
  readonly rows: readonly WorkRow[];
}

export interface OpeningGroup {
  readonly openingId: CircuitRow['openingId'];
  readonly openingName: string;
  readonly sentBack: readonly WorkRow[];
  readonly areas: readonly AreaGroup[];
}

const byCode = (a: WorkRow, b: WorkRow): number => a.code.localeCompare(b.code, 'en', { numeric: true });

/**
 * Circuits as an installer walks them: opening by opening; what was sent back first, whatever its area, then area by
 * area. Codes sort as people count: A2 before A10.
 */
export function groupCircuits(rows: readonly WorkRow[]): readonly OpeningGroup[] {
  return grouped(rows, (row) => row.openingId).map(([openingId, ofOpening]): OpeningGroup => {
    const others = ofOpening.filter((row) => row.state !== 'sentBack');
    return {
      openingId,
      openingName: ofOpening[0]?.openingName ?? '',
      sentBack: ofOpening.filter((row) => row.state === 'sentBack').sort(byCode),
      areas: grouped(others, (row) => row.area)
        .map(([area, inArea]): AreaGroup => ({ area, rows: [...inArea].sort(byCode) }))
        .sort((a, b) => a.area.localeCompare(b.area)),
    };
  });
}

/** Rows by a key, in the order in which the keys first appear. `Map.groupBy` is missing on phones a few years old. */
function grouped<K>(rows: readonly WorkRow[], keyOf: (row: WorkRow) => K): [K, WorkRow[]][] {
  const groups = new Map<K, WorkRow[]>();
  for (const row of rows) groups.set(keyOf(row), [...(groups.get(keyOf(row)) ?? []), row]);
  return [...groups];
}
