import type { CompanyId, OpeningId, SequenceId, SuctionGroupId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';

/** One circuit of a suction group with what its sequence folds to. */
export interface GroupCircuitRow {
  readonly sequenceId: SequenceId;
  readonly companyId: CompanyId;
  readonly code: string;
  readonly loadW: number | null;
  readonly stepListHash: string;
  readonly fold: string;
}

/** More circuits than any compressor group has. */
const MOST_CIRCUITS = 500;

export class FloodHuntRepository {
  /** The group's name, or `null` when this opening has no such group. */
  async findGroupName(context: Context, openingId: OpeningId, id: SuctionGroupId): Promise<string | null> {
    const rows: { name: string }[] = await managerOf(context).query(
      `SELECT name FROM suction_group WHERE id = ? AND opening_id = ? AND removed_at IS NULL`,
      [id, openingId],
    );
    return rows[0]?.name ?? null;
  }

  /** The group's circuits that have a checklist, in the order of the schedule; its own work is none of them. */
  async findCircuits(
    context: Context,
    openingId: OpeningId,
    groupId: SuctionGroupId,
  ): Promise<GroupCircuitRow[]> {
    return managerOf(context).query(
      `SELECT s.id AS sequenceId, s.company_id AS companyId, c.code, c.load_w AS loadW,
              s.step_list_hash AS stepListHash, s.fold
         FROM circuit c JOIN sequence s ON s.circuit_id = c.id
        WHERE c.suction_group_id = ? AND c.opening_id = ? AND c.level = 'circuit' AND c.removed_at IS NULL
        ORDER BY c.ordinal LIMIT ${MOST_CIRCUITS}`,
      [groupId, openingId],
    );
  }
}
