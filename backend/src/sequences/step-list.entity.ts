import { Entity } from 'typeorm';
import { PrimaryColumn } from 'typeorm';
import { LongTextColumn, RefColumn, TimeColumn } from '../database/columns';

/** Expanded steps under the hash of their canonical JSON: what an expansion entry binds. */
@Entity('step_list')
export class StepListEntity {
  @PrimaryColumn({ type: 'uuid' }) companyId!: string;
  @PrimaryColumn({ type: 'char', length: 64, charset: 'ascii', collation: 'ascii_bin' }) hash!: string;
  @RefColumn() openingId!: string;
  @LongTextColumn() content!: string;
  @TimeColumn() createdAt!: Date;
}
