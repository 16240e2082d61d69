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

@Entity('fixture')
@Unique('UQ_fixture_tag', ['circuitId', 'tag'])
export class FixtureEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() circuitId!: string;
  @TextColumn(40) tag!: string;
  @TextColumn(200) description!: string;
  @WordColumn(16) kind!: string;
  @DoubleColumn({ nullable: true }) lengthM!: number | null;
  @DoubleColumn() evaporatingTemperatureK!: number;
  @WordColumn(8) evaporatingBasis!: string;
  @DoubleColumn() dischargeAirTemperatureK!: number;
  @DoubleColumn() superheatLowK!: number;
  @DoubleColumn() superheatHighK!: number;
  @WordColumn(16) valveKind!: string;
  @IntColumn() ordinal!: number;
  @TimeColumn({ nullable: true }) removedAt!: Date | null;
}
