import { Entity, Index } from 'typeorm';
import { IdColumn, LongTextColumn, RefColumn, TimeColumn } from '../database/columns';

/** A hint for open screens, read by every server; swept after an hour. */
@Entity('live_event')
@Index('IX_live_event_time', ['createdAt'])
export class LiveEventEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @LongTextColumn() content!: string;
  @TimeColumn() createdAt!: Date;
}
