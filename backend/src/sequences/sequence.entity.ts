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

/**
 * A sequence's row: the lock that entries are appended under, and what the entries fold to. `fold` can always be worked
 * out again from the entries; the counts beside it are there so that lists need not read it.
 */
@Entity('sequence')
@Unique('UQ_sequence_circuit', ['circuitId'])
@Index('IX_sequence_opening_state', ['openingId', 'state', 'submittedAt'])
export class SequenceEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() openingId!: string;
  @RefColumn() circuitId!: string;
  @WordColumn(16) state!: string;
  @HashColumn() stepListHash!: string;
  @LongTextColumn() fold!: string;
  @IntColumn() headPosition!: number;
  @HashColumn() headHash!: string;
  @IntColumn() round!: number;
  @IntColumn() stepsTotal!: number;
  @IntColumn() stepsDone!: number;
  @IntColumn() outsideCount!: number;
  @IntColumn() notApplicableCount!: number;
  @IntColumn() answeredTwiceCount!: number;
  @IntColumn() lateCount!: number;
  @TimeColumn({ nullable: true }) submittedAt!: Date | null;
  @RefColumn({ nullable: true }) submittedBy!: string | null;
  @TimeColumn() createdAt!: Date;
}
