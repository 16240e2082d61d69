import { In } from 'typeorm';
import type { CircuitCounts } from '#shared/contracts/openings';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import { MembershipEntity } from '../people/membership.entity';
import { OpeningEntity } from './opening.entity';

const NONE: CircuitCounts = { open: 0, underWay: 0, submitted: 0, sentBack: 0, approved: 0 };

export class OpeningsRepository {
  async find(context: Context, id: OpeningId): Promise<OpeningEntity | null> {
    return managerOf(context).findOneBy(OpeningEntity, { id });
  }

  /** Takes the opening's row lock: imports of a schedule come one after the other. */
  async lock(context: Context, id: OpeningId): Promise<OpeningEntity | null> {
    return managerOf(context).findOne(OpeningEntity, { where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  async insert(context: Context, opening: OpeningEntity, membership: MembershipEntity): Promise<void> {
    await managerOf(context).insert(OpeningEntity, opening);
    await managerOf(context).insert(MembershipEntity, membership);
  }

  async setScheduleRevision(context: Context, id: OpeningId, scheduleRevision: number): Promise<void> {
    await managerOf(context).update(OpeningEntity, { id }, { scheduleRevision });
  }

  /**
   * The openings that somebody may see, soonest opening day first.
   *
   * @param ids those of the memberships
   * @param companyId for an admin: all of the company too
   * @param after `date id` of the last one on the page before
   */
  async findPage(
    context: Context,
    ids: readonly OpeningId[],
    companyId: CompanyId | null,
    limit: number,
    after: { date: string; id: string } | null,
  ): Promise<OpeningEntity[]> {
    if (ids.length === 0 && companyId === null) return [];
    const query = managerOf(context)
      .createQueryBuilder(OpeningEntity, 'o')
      .where('(o.id IN (:...ids) OR o.companyId = :companyId)', {
        ids: ids.length > 0 ? ids : [''],
        companyId: companyId ?? '',
      })
      .orderBy('o.openingDate', 'ASC')
      .addOrderBy('o.id', 'ASC')
      .take(limit);
    if (after) query.andWhere('(o.openingDate > :date OR (o.openingDate = :date AND o.id > :id))', after);
    return query.getMany();
  }

  /** Ids and companies of the openings of the memberships, and of all of the company for an admin. */
  async findSubjects(
    context: Context,
    ids: readonly OpeningId[],
    companyId: CompanyId | null,
  ): Promise<{ companyId: CompanyId; openingId: OpeningId }[]> {
    if (ids.length === 0 && companyId === null) return [];
    const rows = await managerOf(context).find(OpeningEntity, {
      select: { id: true, companyId: true },
      where: [...(ids.length > 0 ? [{ id: In([...ids]) }] : []), ...(companyId ? [{ companyId }] : [])],
      take: 5000,
    });
    return rows.map((row) => ({ companyId: row.companyId as CompanyId, openingId: row.id as OpeningId }));
  }

  /** How many circuits of each opening stand where. */
  async countCircuits(context: Context, ids: readonly OpeningId[]): Promise<Map<OpeningId, CircuitCounts>> {
    const counts = new Map(ids.map((id) => [id, { ...NONE }]));
    if (ids.length === 0) return counts;
    const rows: { openingId: OpeningId; state: keyof CircuitCounts; n: string | number }[] = await managerOf(
      context,
    ).query(
      `SELECT s.opening_id AS openingId,
              CASE WHEN s.state = 'open' AND s.head_position > 1 THEN 'underWay' ELSE s.state END AS state,
              COUNT(*) AS n
         FROM sequence s JOIN circuit c ON c.id = s.circuit_id AND c.level = 'circuit' AND c.removed_at IS NULL
        WHERE s.opening_id IN (${ids.map(() => '?').join(',')}) GROUP BY 1, 2`,
      [...ids],
    );
    for (const row of rows) {
      const count = counts.get(row.openingId);
      if (count) count[row.state] = Number(row.n);
    }
    return counts;
  }
}
