import { Entity, Unique } from 'typeorm';
import { IdColumn, IntColumn, RefColumn, TimeColumn } from '../database/columns';

@Entity('coil')
@Unique('UQ_coil_number', ['fixtureId', 'number'])
export class CoilEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() circuitId!: string;
  @RefColumn() fixtureId!: string;
  @IntColumn() number!: number;
  @TimeColumn({ nullable: true }) removedAt!: Date | null;
}
