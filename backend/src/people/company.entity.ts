import { Entity } from 'typeorm';
import { IdColumn, TextColumn, TimeColumn } from '../database/columns';

@Entity('company')
export class CompanyEntity {
  @IdColumn() id!: string;
  @TextColumn(120) name!: string;
  @TimeColumn() createdAt!: Date;
}
