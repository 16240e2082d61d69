import type { OpeningId, PackageId, SequenceId } from '#shared/plant/ids';

/** A mail to be sent: everything in it was decided in the transaction that caused it. */
export interface MailPayload {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

/** What each kind of job is told. */
export interface JobPayloads {
  readonly mail: MailPayload;
  readonly photoCheck: { readonly sequenceId: SequenceId; readonly sha256: string };
  readonly package: { readonly packageId: PackageId; readonly openingId: OpeningId };
}

export type JobKind = keyof JobPayloads;

/** How long a worker may go silent before another takes the job over, and how often it is tried. */
export const JOB_RULES: Readonly<Record<JobKind, { leaseS: number; maxAttempts: number }>> = {
  mail: { leaseS: 60, maxAttempts: 12 },
  photoCheck: { leaseS: 120, maxAttempts: 5 },
  package: { leaseS: 60, maxAttempts: 3 },
};
