import type { CircuitRow } from '#shared/contracts/openings';
import type { OpeningId, PersonId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';

/** A row of the table with what the next page begins after. */
export type CircuitListRow = CircuitRow & { readonly ordinal: number };

const COLUMNS = `
  c.id AS circuitId, c.level, s.id AS sequenceId, c.code, c.description, c.area, sys.name AS systemName,
  COALESCE(g.name, '') AS suctionGroupName, c.temperature_class AS temperatureClass,
  CASE WHEN s.id IS NULL THEN 'noSequence'
       WHEN s.state = 'open' AND s.head_position > 1 THEN 'underWay' ELSE s.state END AS state,
  COALESCE(s.steps_done, 0) AS stepsDone, COALESCE(s.steps_total, 0) AS stepsTotal,
  COALESCE(s.outside_count, 0) AS outsideCount, c.assignee_id AS assigneeId, p.name AS assigneeName,
  o.id AS openingId, o.name AS openingName, c.ordinal`;

const TABLES = `
  circuit c
  JOIN opening o ON o.id = c.opening_id
  JOIN plant_system sys ON sys.id = c.system_id
  LEFT JOIN suction_group g ON g.id = c.suction_group_id
  LEFT JOIN sequence s ON s.circuit_id = c.id
  LEFT JOIN person p ON p.id = c.assignee_id`;

export class CircuitListRepository {
  /** Circuits of an opening in the order of the schedule. */
  async findOfOpening(
    context: Context,
    openingId: OpeningId,
    limit: number,
    afterOrdinal: number,
  ): Promise<CircuitListRow[]> {
    return managerOf(context).query(
      `SELECT ${COLUMNS} FROM ${TABLES}
        WHERE c.opening_id = ? AND c.removed_at IS NULL AND c.ordinal > ? ORDER BY c.ordinal LIMIT ?`,
      [openingId, afterOrdinal, limit],
    );
  }

  /** Circuits assigned to a person in the openings where that person still has a role. */
  async findOfAssignee(
    context: Context,
    personId: PersonId,
    openingIds: readonly OpeningId[],
    limit: number,
    after: { openingId: string; ordinal: number } | null,
  ): Promise<CircuitListRow[]> {
    if (openingIds.length === 0) return [];
    const cursor = after ? 'AND (c.opening_id > ? OR (c.opening_id = ? AND c.ordinal > ?))' : '';
    return managerOf(context).query(
      `SELECT ${COLUMNS} FROM ${TABLES}
        WHERE c.assignee_id = ? AND c.opening_id IN (${openingIds.map(() => '?').join(',')})
          AND c.removed_at IS NULL ${cursor}
        ORDER BY c.opening_id, c.ordinal LIMIT ?`,
      [personId, ...openingIds, ...(after ? [after.openingId, after.openingId, after.ordinal] : []), limit],
    );
  }
}
