import { Entity, Index, Unique } from 'typeorm';
import {
  DoubleColumn,
  IdColumn,
  IntColumn,
  LongTextColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

/** Background work, written in the transaction that causes it. */
@Entity('job')
@Unique('UQ_job_key', ['uniqueKey'])
@Index('IX_job_due', ['kind', 'state', 'runAfter'])
export class JobEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @WordColumn(32) kind!: string;
  /** What makes enqueuing twice do nothing twice. */
  @WordColumn(160) uniqueKey!: string;
  @LongTextColumn() payload!: string;
  @WordColumn(16) state!: string;
  @IntColumn() attempts!: number;
  @DoubleColumn() progress!: number;
  @TimeColumn() createdAt!: Date;
  @TimeColumn() runAfter!: Date;
  /** A running job whose worker has not renewed this is taken by another. */
  @TimeColumn({ nullable: true }) leaseUntil!: Date | null;
  @TextColumn(1000, { nullable: true }) lastError!: string | null;
}
