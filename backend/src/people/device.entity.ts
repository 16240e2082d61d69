import { Entity, Index } from 'typeorm';
import { HashColumn, IdColumn, IntColumn, RefColumn, TextColumn, TimeColumn } from '../database/columns';

/** One browser of one person. Only the hash of its credential is kept. */
@Entity('device')
@Index('IX_device_person', ['personId'])
export class DeviceEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() personId!: string;
  @TextColumn(120) label!: string;
  @HashColumn() credentialHash!: string;
  @IntColumn() lastCount!: number;
  @TimeColumn() createdAt!: Date;
  @TimeColumn() expiresAt!: Date;
  @TimeColumn({ nullable: true }) revokedAt!: Date | null;
}
