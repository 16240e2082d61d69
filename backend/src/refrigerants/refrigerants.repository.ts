import { In } from 'typeorm';
import { managerOf, type Context } from '../database/transactions';
import { RefrigerantTableEntity } from './refrigerant-table.entity';

/** Where a page begins: behind this row. */
export interface RefrigerantTableCursor {
  readonly createdAt: Date;
  readonly id: string;
}

/** Newest first; the id only keeps the order of two rows of one millisecond the same in every answer. */
const NEWEST_FIRST = { createdAt: 'DESC', id: 'DESC' } as const;

export class RefrigerantsRepository {
  async insert(context: Context, table: RefrigerantTableEntity): Promise<void> {
    await managerOf(context).insert(RefrigerantTableEntity, table);
  }

  /** A page of the company's tables, newest first. */
  async findPage(
    context: Context,
    companyId: string,
    limit: number,
    after: RefrigerantTableCursor | null,
  ): Promise<RefrigerantTableEntity[]> {
    const query = managerOf(context)
      .createQueryBuilder(RefrigerantTableEntity, 't')
      .where('t.companyId = :companyId', { companyId })
      .orderBy('t.createdAt', 'DESC')
      .addOrderBy('t.id', 'DESC')
      .take(limit);
    if (after)
      query.andWhere('(t.createdAt < :createdAt OR (t.createdAt = :createdAt AND t.id < :id))', after);
    return query.getMany();
  }

  /** The newest table of each refrigerant of the company. */
  async findNewest(context: Context, companyId: string): Promise<RefrigerantTableEntity[]> {
    const ids = await this.findNewestIds(context, companyId);
    if (ids.size === 0) return [];
    return managerOf(context).findBy(RefrigerantTableEntity, { companyId, id: In([...ids]) });
  }

  /** The ids of those, without reading any figures. */
  async findNewestIds(context: Context, companyId: string): Promise<ReadonlySet<string>> {
    const rows = await managerOf(context).find(RefrigerantTableEntity, {
      select: { id: true, designationKey: true },
      where: { companyId },
      order: NEWEST_FIRST,
    });
    const newest = new Map<string, string>();
    for (const { id, designationKey } of rows)
      if (!newest.has(designationKey)) newest.set(designationKey, id);
    return new Set(newest.values());
  }
}
