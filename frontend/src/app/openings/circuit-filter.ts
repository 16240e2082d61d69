import type { CircuitRow } from '#shared/contracts/openings';

/** What the table is narrowed to; empty texts narrow nothing. All of it stands in the address. */
export interface CircuitFilter {
  readonly text: string;
  readonly area: string;
  readonly state: string;
  /** A person's id, or `nobody`. */
  readonly assignee: string;
}

/** Stands for circuits that nobody was given. */
export const NOBODY = 'nobody';

/** The circuits that a filter lets through, in their order. Every word of the text has to be found somewhere. */
export function filterCircuits(rows: readonly CircuitRow[], filter: CircuitFilter): readonly CircuitRow[] {
  const words = plain(filter.text).split(/\s+/).filter(Boolean);
  return rows.filter((row) => {
    if (filter.area !== '' && row.area !== filter.area) return false;
    if (filter.state !== '' && row.state !== filter.state) return false;
    if (filter.assignee !== '' && (row.assigneeId ?? NOBODY) !== filter.assignee) return false;
    const text = plain(
      [
        row.code,
        row.description,
        row.area,
        row.systemName,
        row.suctionGroupName,
        row.assigneeName ?? '',
      ].join(' '),
    );
    return words.every((word) => text.includes(word));
  });
}

/** The areas that occur, sorted for a select. */
export function areasOf(rows: readonly CircuitRow[]): readonly string[] {
  return [...new Set(rows.map(({ area }) => area))]
    .filter((area) => area !== '')
    .sort((a, b) => a.localeCompare(b));
}

function plain(text: string): string {
  return text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
}
