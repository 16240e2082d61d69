import { Entity, Unique } from 'typeorm';
import {
  DoubleColumn,
  IdColumn,
  IntColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

@Entity('suction_group')
@Unique('UQ_suction_group_name', ['systemId', 'name'])
export class SuctionGroupEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() systemId!: string;
  @TextColumn(80) name!: string;
  @WordColumn(16) temperatureClass!: string;
  @DoubleColumn() saturatedSuctionTemperatureK!: number;
  @IntColumn() ordinal!: number;
  @TimeColumn({ nullable: true }) removedAt!: Date | null;
}
