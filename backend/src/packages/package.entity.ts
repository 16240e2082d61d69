import { Entity, Unique } from 'typeorm';
import {
  DoubleColumn,
  HashColumn,
  IdColumn,
  IntColumn,
  LongTextColumn,
  RefColumn,
  TextColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

@Entity('handover_package')
@Unique('UQ_handover_package_version', ['openingId', 'version'])
export class PackageEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @IntColumn() version!: number;
  @WordColumn(8) language!: string;
  @WordColumn(16) state!: string;
  @DoubleColumn() progress!: number;
  /** The heads that it shows, taken in one moment: [[sequenceId, position, hash, state], …]. */
  @LongTextColumn() heads!: string;
  @IntColumn() circuitsApproved!: number;
  @IntColumn() circuitsTotal!: number;
  @RefColumn() createdBy!: string;
  @TimeColumn() createdAt!: Date;
  @TimeColumn({ nullable: true }) issuedAt!: Date | null;
  @IntColumn({ nullable: true }) pages!: number | null;
  @IntColumn({ nullable: true }) bytes!: number | null;
  @HashColumn({ nullable: true }) sha256!: string | null;
  /** Base64 Ed25519 signature over the package's statement: opening, version, hash, heads. */
  @WordColumn(128, { nullable: true }) installationSignature!: string | null;
  @TextColumn(500, { nullable: true }) failure!: string | null;
}
