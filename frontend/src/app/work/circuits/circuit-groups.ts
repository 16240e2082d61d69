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
  /** The own work of systems and suction groups, which comes before their circuits'. */
  readonly levels: readonly WorkRow[];
  readonly areas: readonly AreaGroup[];
}

/** An installer's circuits in the order of the day. */
export interface DayOfWork {
  /** Of all openings: what a lead asks for again comes before anything new. */
  readonly sentBack: readonly WorkRow[];
  readonly openings: readonly OpeningGroup[];
  /** Approved, of all openings: nothing to do there any more. */
  readonly done: readonly WorkRow[];
}

const byCode = (a: WorkRow, b: WorkRow): number =>
  a.openingName.localeCompare(b.openingName) || a.code.localeCompare(b.code, 'en', { numeric: true });

/**
 * Circuits as an installer walks them: what was sent back first, whatever its opening and area; then opening by opening
 * the work of systems and suction groups, then area by area; what is approved at the end. Codes sort as people count: A2 before A10.
 */
export function groupCircuits(rows: readonly WorkRow[]): DayOfWork {
  const others = rows.filter((row) => row.state !== 'sentBack' && row.state !== 'approved');
  return {
    sentBack: rows.filter((row) => row.state === 'sentBack').sort(byCode),
    openings: grouped(others, (row) => row.openingId).map(([openingId, ofOpening]) => ({
      openingId,
      openingName: ofOpening[0]?.openingName ?? '',
      levels: ofOpening.filter(isLevelWork).sort(byCode),
      areas: grouped(
        ofOpening.filter((row) => !isLevelWork(row)),
        (row) => row.area,
      )
        .map(([area, inArea]): AreaGroup => ({ area, rows: [...inArea].sort(byCode) }))
        .sort((a, b) => a.area.localeCompare(b.area)),
    })),
    done: rows.filter((row) => row.state === 'approved').sort(byCode),
  };
}

/** Rows that this phone kept before there was such work have no level: they are circuits. */
const isLevelWork = ({ level }: WorkRow): boolean => level === 'system' || level === 'suctionGroup';

/** Rows by a key, in the order in which the keys first appear. `Map.groupBy` is missing on phones a few years old. */
function grouped<K>(rows: readonly WorkRow[], keyOf: (row: WorkRow) => K): [K, WorkRow[]][] {
  const groups = new Map<K, WorkRow[]>();
  for (const row of rows) groups.set(keyOf(row), [...(groups.get(keyOf(row)) ?? []), row]);
  return [...groups];
}
