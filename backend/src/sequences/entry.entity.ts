import { Entity, Index, Unique } from 'typeorm';
import {
  HashColumn,
  IdColumn,
  IntColumn,
  LongTextColumn,
  RefColumn,
  TimeColumn,
  WordColumn,
} from '../database/columns';

/** Append-only: the application's account has no UPDATE or DELETE here. */
@Entity('entry')
@Unique('UQ_entry_position', ['sequenceId', 'position'])
@Index('IX_entry_device', ['deviceId', 'deviceCount'])
export class EntryEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() sequenceId!: string;
  @IntColumn() position!: number;
  @RefColumn() authorId!: string;
  @RefColumn({ nullable: true }) deviceId!: string | null;
  @IntColumn() deviceCount!: number;
  @WordColumn(16) kind!: string;
  @WordColumn(16) standing!: string;
  @TimeColumn() receivedAt!: Date;
  /** Canonical JSON, byte for byte what `bodyHash` is the hash of. */
  @LongTextColumn() body!: string;
  @HashColumn() bodyHash!: string;
  /** Canonical JSON of what the server added. */
  @LongTextColumn() serverPart!: string;
  @HashColumn() previousHash!: string;
  @HashColumn() hash!: string;
}
