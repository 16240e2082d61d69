import { Entity, Unique } from 'typeorm';
import {
  HashColumn,
  IdColumn,
  IntColumn,
  LongTextColumn,
  RefColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

/** A published template version of a company; never changed, a new version is a new row. */
@Entity('template_version')
@Unique('UQ_template_version', ['companyId', 'key', 'version'])
export class TemplateVersionEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @WordColumn(80) key!: string;
  @IntColumn() version!: number;
  @LongTextColumn() source!: string;
  @HashColumn() sourceHash!: string;
  @TimeColumn() createdAt!: Date;
}
