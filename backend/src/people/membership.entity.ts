import { Entity, Index, Unique } from 'typeorm';
import { IdColumn, RefColumn, TimeColumn, WordColumn } from '../database/columns';

/** A person's role in one opening. Ended ones stay: entries that such a person still sends are held, not dropped. */
@Entity('membership')
@Unique('UQ_membership_opening_person', ['openingId', 'personId'])
@Index('IX_membership_person', ['personId'])
export class MembershipEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() personId!: string;
  @WordColumn(16) role!: string;
  @TimeColumn() createdAt!: Date;
  @TimeColumn({ nullable: true }) endedAt!: Date | null;
}
