import { Entity, Index, Unique } from 'typeorm';
import { BooleanColumn, IdColumn, RefColumn, TextColumn, TimeColumn, WordColumn } from '../database/columns';

@Entity('person')
@Unique('UQ_person_email', ['email'])
@Index('IX_person_company', ['companyId'])
export class PersonEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @TextColumn(120) name!: string;
  /** Lower case. */
  @TextColumn(254, { charset: 'utf8mb4', collation: 'utf8mb4_bin' }) email!: string;
  @WordColumn(255) passwordHash!: string;
  @WordColumn(16) companyRole!: string;
  @WordColumn(8) language!: string;
  @BooleanColumn() isActive!: boolean;
  @TimeColumn() createdAt!: Date;
}
