import { Entity, Index } from 'typeorm';
import { HashColumn, IdColumn, LongTextColumn, RefColumn, TimeColumn, WordColumn } from '../database/columns';

/**
 * What an approval is signed with: the installation's Ed25519 signature over the head that was reviewed and the review
 * entry that says so. Append-only.
 */
@Entity('review')
@Index('IX_review_sequence', ['sequenceId'])
export class ReviewEntity {
  @IdColumn() id!: string;
  @RefColumn() companyId!: string;
  @RefColumn() sequenceId!: string;
  @RefColumn() entryId!: string;
  @RefColumn() reviewerId!: string;
  @WordColumn(16) verdict!: string;
  @HashColumn() headHash!: string;
  /** Canonical JSON of the signed statement. */
  @LongTextColumn() statement!: string;
  /** Base64 Ed25519 signature of the statement's UTF-8 bytes (RFC 8032). */
  @WordColumn(128) installationSignature!: string;
  @HashColumn() keyFingerprint!: string;
  @TimeColumn() createdAt!: Date;
}
