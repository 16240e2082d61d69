import { Entity, Index } from 'typeorm';
import { PrimaryColumn } from 'typeorm';
import { IntColumn, RefColumn, TextColumn, TimeColumn, WordColumn } from '../database/columns';

/** A photo that arrived for a sequence, by the hash of its bytes. */
@Entity('photo')
@Index('IX_photo_company', ['companyId', 'sha256'])
export class PhotoEntity {
  @PrimaryColumn({ type: 'uuid' }) sequenceId!: string;
  @PrimaryColumn({ type: 'char', length: 64, charset: 'ascii', collation: 'ascii_bin' }) sha256!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() personId!: string;
  @IntColumn() bytes!: number;
  @IntColumn() width!: number;
  @IntColumn() height!: number;
  @WordColumn(16) state!: string;
  @TextColumn(300, { nullable: true }) failure!: string | null;
  @TimeColumn() createdAt!: Date;
}
