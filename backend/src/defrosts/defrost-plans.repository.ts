import type { OpeningId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import { DefrostPlanEntity } from './defrost-plan.entity';

export interface DefrostPlanRow extends DefrostPlanEntity {
  readonly createdByName: string;
}

export class DefrostPlansRepository {
  async insert(context: Context, row: DefrostPlanEntity): Promise<void> {
    await managerOf(context).insert(DefrostPlanEntity, row);
  }

  async findLastVersion(context: Context, openingId: OpeningId): Promise<number> {
    return (await managerOf(context).maximum(DefrostPlanEntity, 'version', { openingId })) ?? 0;
  }

  async findNewest(context: Context, openingId: OpeningId): Promise<DefrostPlanRow | null> {
    return this.query(context, 'd.openingId = :openingId', { openingId });
  }

  async find(context: Context, openingId: OpeningId, id: string): Promise<DefrostPlanRow | null> {
    return this.query(context, 'd.openingId = :openingId AND d.id = :id', { openingId, id });
  }

  private async query(
    context: Context,
    where: string,
    parameters: Record<string, string>,
  ): Promise<DefrostPlanRow | null> {
    const { entities, raw } = await managerOf(context)
      .createQueryBuilder(DefrostPlanEntity, 'd')
      .innerJoin('person', 'p', 'p.id = d.created_by')
      .addSelect('p.name', 'createdByName')
      .where(where, parameters)
      .orderBy('d.version', 'DESC')
      .limit(1)
      .getRawAndEntities<{ createdByName: string }>();
    const [entity] = entities;
    return entity ? { ...entity, createdByName: raw[0]?.createdByName ?? '' } : null;
  }
}
