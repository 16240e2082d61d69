import { uuidv7 } from 'uuidv7';
import { managerOf, type Context } from '../database/transactions';
import { AuditEntity } from './audit.entity';

export interface AuditRecord {
  readonly companyId: string;
  readonly openingId?: string | null;
  readonly personId?: string | null;
  /** What was done, such as `schedule.imported`. */
  readonly action: string;
  /** The id of what it was done to. */
  readonly subject: string;
  readonly before?: unknown;
  readonly after?: unknown;
}

/** The audit trail. Written in the transaction of the change that it tells of. */
export class AuditRepository {
  async append(context: Context, record: AuditRecord): Promise<void> {
    await managerOf(context).insert(AuditEntity, {
      id: uuidv7(),
      companyId: record.companyId,
      openingId: record.openingId ?? null,
      personId: record.personId ?? null,
      action: record.action,
      subject: record.subject,
      before: record.before === undefined ? null : JSON.stringify(record.before),
      after: record.after === undefined ? null : JSON.stringify(record.after),
      createdAt: new Date(),
    });
  }
}
