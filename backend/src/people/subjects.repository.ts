import type { AccessSubject } from '#shared/access/may';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';

const QUERIES = {
  opening: 'SELECT company_id AS companyId, id AS openingId FROM opening WHERE id = ?',
  sequence: 'SELECT company_id AS companyId, opening_id AS openingId FROM sequence WHERE id = ?',
  package: 'SELECT company_id AS companyId, opening_id AS openingId FROM handover_package WHERE id = ?',
} as const;

/** To whom things belong: the first question of every access decision. */
export class SubjectsRepository {
  async find(context: Context, kind: keyof typeof QUERIES, id: string): Promise<AccessSubject | null> {
    const rows: { companyId: CompanyId; openingId: OpeningId }[] = await managerOf(context).query(
      QUERIES[kind],
      [id],
    );
    return rows[0] ?? null;
  }
}
