import { Entity, Index } from 'typeorm';
import { IdColumn, LongTextColumn, RefColumn, TimeColumn, WordColumn } from '../database/columns';

/** Who changed what, when. Append-only. */
@Entity('audit')
@Index('IX_audit_company', ['companyId', 'createdAt'])
export class AuditEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn({ nullable: true }) openingId!: string | null;
  @RefColumn({ nullable: true }) personId!: string | null;
  @WordColumn(48) action!: string;
  @WordColumn(64) subject!: string;
  @LongTextColumn({ nullable: true }) before!: string | null;
  @LongTextColumn({ nullable: true }) after!: string | null;
  @TimeColumn() createdAt!: Date;
}
