import type { Context } from '../database/transactions';
import type { AuditRecord, AuditRepository } from './audit.repository';

/** The audit trail: every change of a thing that can change is told here, in the change's own transaction. */
export class AuditService {
  constructor(private readonly audit: AuditRepository) {}

  async append(context: Context, record: AuditRecord): Promise<void> {
    await this.audit.append(context, record);
  }
}
