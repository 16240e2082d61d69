import { Entity, Unique } from 'typeorm';
import { HashColumn, IdColumn, LongTextColumn, RefColumn, TimeColumn, WordColumn } from '../database/columns';

/** A contractor's signature under one package. Append-only. */
@Entity('acceptance')
@Unique('UQ_acceptance_package', ['packageId'])
export class AcceptanceEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() packageId!: string;
  @RefColumn() personId!: string;
  @HashColumn() sha256!: string;
  @LongTextColumn() statement!: string;
  @WordColumn(128) installationSignature!: string;
  @TimeColumn() createdAt!: Date;
}
