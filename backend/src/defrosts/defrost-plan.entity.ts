import { Entity, Unique } from 'typeorm';
import { IdColumn, IntColumn, LongTextColumn, RefColumn, TimeColumn } from '../database/columns';

/** One version of an opening's defrost plan; the newest counts. Append-only: an earlier package shows an earlier one. */
@Entity('defrost_plan')
@Unique('UQ_defrost_plan_version', ['openingId', 'version'])
export class DefrostPlanEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @IntColumn() version!: number;
  @LongTextColumn() rules!: string;
  /** What the lead gave by hand, circuit by circuit. */
  @LongTextColumn() details!: string;
  /** The circuits as the plan was checked with, schedule and details in one. */
  @LongTextColumn() circuits!: string;
  @LongTextColumn() plan!: string;
  /** Breaches and notes that the server found. */
  @LongTextColumn() findings!: string;
  @RefColumn() createdBy!: string;
  @TimeColumn() createdAt!: Date;
}
