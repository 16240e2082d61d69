import { Entity, Index, Unique } from 'typeorm';
import {
  DoubleColumn,
  IdColumn,
  IntColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

/**
 * The unit of work and of sign-off. A suction group's and a system's own work stands here too, with its level: it is
 * assigned, recorded, reviewed and approved like a circuit's.
 */
@Entity('circuit')
@Unique('UQ_circuit_code', ['openingId', 'level', 'code'])
@Index('IX_circuit_group', ['suctionGroupId'])
@Index('IX_circuit_assignee', ['assigneeId', 'openingId'])
export class CircuitEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @WordColumn(16) level!: string;
  @RefColumn() systemId!: string;
  /** `null` for the work of a whole system. */
  @RefColumn({ nullable: true }) suctionGroupId!: string | null;
  @TextColumn(170) code!: string;
  @TextColumn(200) description!: string;
  @TextColumn(80) area!: string;
  @WordColumn(16) temperatureClass!: string;
  @WordColumn(32) feed!: string;
  @WordColumn(32) control!: string;
  @DoubleColumn({ nullable: true }) loadW!: number | null;
  @WordColumn(16) defrostType!: string;
  @IntColumn() defrostPerDay!: number;
  @DoubleColumn({ nullable: true }) defrostFailSafeS!: number | null;
  @DoubleColumn({ nullable: true }) defrostTerminationTemperatureK!: number | null;
  @DoubleColumn({ nullable: true }) defrostDripS!: number | null;
  @RefColumn({ nullable: true }) assigneeId!: string | null;
  @IntColumn() ordinal!: number;
  /** Counts the imports that changed something about this circuit. */
  @IntColumn() revision!: number;
  @TimeColumn({ nullable: true }) removedAt!: Date | null;
}
