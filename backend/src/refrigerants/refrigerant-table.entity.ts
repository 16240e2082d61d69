import type { SafetyClass } from '#shared/refrigeration/saturation/saturation-table';
import { Entity, Index } from 'typeorm';
import {
  DoubleColumn,
  IdColumn,
  LongTextColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

/** A maker's pressure–temperature table as a company entered it; never changed, a newer sheet is a new row. */
@Entity('refrigerant_table')
@Index('IX_refrigerant_table_company', ['companyId', 'createdAt'])
export class RefrigerantTableEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  /** What all ways of writing the refrigerant have in common: by it the table is found. */
  @WordColumn(24) designationKey!: string;
  @WordColumn(24) designation!: string;
  @TextColumn(120) issuer!: string;
  @TextColumn(120) edition!: string;
  @DoubleColumn() printedStepPa!: number;
  @WordColumn(4) safetyClass!: SafetyClass;
  /** JSON: temperatures in kelvin with absolute pressures in pascals, ascending. */
  @LongTextColumn() points!: string;
  @RefColumn() createdBy!: string;
  @TimeColumn() createdAt!: Date;
}
