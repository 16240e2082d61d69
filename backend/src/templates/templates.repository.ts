import { uuidv7 } from 'uuidv7';
import { managerOf, type Context } from '../database/transactions';
import { TemplateVersionEntity } from './template-version.entity';

export class TemplatesRepository {
  /** The newest version of each template of the company. */
  async findNewest(context: Context, companyId: string): Promise<TemplateVersionEntity[]> {
    const rows = await managerOf(context).find(TemplateVersionEntity, {
      where: { companyId },
      order: { key: 'ASC', version: 'DESC' },
    });
    return rows.filter((row, index) => rows[index - 1]?.key !== row.key);
  }

  /** Publishes a version; one that is there already stays as it is. */
  async insertIfNew(
    context: Context,
    version: Pick<TemplateVersionEntity, 'companyId' | 'key' | 'version' | 'source' | 'sourceHash'>,
  ): Promise<void> {
    await managerOf(context)
      .createQueryBuilder()
      .insert()
      .into(TemplateVersionEntity)
      .values({ id: uuidv7(), createdAt: new Date(), ...version })
      .orIgnore()
      .updateEntity(false)
      .execute();
  }
}
