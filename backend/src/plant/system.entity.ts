import { Entity, Unique } from 'typeorm';
import { IdColumn, IntColumn, RefColumn, TextColumn, TimeColumn, WordColumn } from '../database/columns';

@Entity('plant_system')
@Unique('UQ_plant_system_name', ['openingId', 'name'])
export class SystemEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @TextColumn(80) name!: string;
  @WordColumn(24) kind!: string;
  @WordColumn(24) refrigerant!: string;
  @IntColumn() ordinal!: number;
  @TimeColumn({ nullable: true }) removedAt!: Date | null;
}
