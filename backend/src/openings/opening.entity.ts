import { Column, Entity, Index } from 'typeorm';
import {
  DoubleColumn,
  IdColumn,
  IntColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

@Entity('opening')
@Index('IX_opening_company', ['companyId'])
export class OpeningEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @TextColumn(120) name!: string;
  @TextColumn(300) address!: string;
  @DoubleColumn() elevationM!: number;
  /** A calendar day in the opening's time zone, as text: a Date would move it by the server's zone. */
  @Column({ type: 'date' }) openingDate!: string;
  @WordColumn(64) timeZone!: string;
  @TextColumn(120) contractorName!: string;
  @WordColumn(8) unitSystem!: string;
  @WordColumn(8) language!: string;
  @IntColumn() scheduleRevision!: number;
  @TimeColumn() createdAt!: Date;
}
