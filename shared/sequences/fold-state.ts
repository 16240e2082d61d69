import * as z from 'zod/mini';
import { OUTCOMES } from '../checklist/judgement';
import { deviceIdSchema, entryIdSchema, personIdSchema, sha256Schema } from '../plant/ids';
import { restsOnSchema } from './entry';
import { SEQUENCE_STATES } from './transitions';

/** Where one step stands: the entry that counts now, or the last that didn't. */
export const stepFoldSchema = z.object({
  entryId: entryIdSchema,
  outcome: z.enum(OUTCOMES),
  counts: z.boolean(),
  /** An override that was set and not yet put back. */
  overrideStanding: z.boolean(),
  /** Somebody answered without having seen an earlier answer: both are kept, the later counts, people are told. */
  answeredTwice: z.boolean(),
  /** A signature stands under what was recorded when it was made: whatever is recorded after asks for it again.
   * What the same device recorded before it and sent later does not: `count` is the signature's own on this sequence. */
  signed: z.nullable(z.object({ deviceId: z.nullable(deviceIdSchema), count: z.int() })),
  /** When a superheat that counts was read, by the clock of its device: a later change on the circuit makes it stale. */
  readAt: z.optional(z.object({ deviceId: z.nullable(deviceIdSchema), at: z.iso.datetime() })),
  /**
   * What asked for this step again, until it is answered anew: a review, an expansion, what was recorded after it was
   * signed, or a change on the circuit that made its reading stale.
   */
  reopenedBy: z.nullable(entryIdSchema),
});
export type StepFold = z.infer<typeof stepFoldSchema>;

/** Which of a device's entries on this sequence have arrived: all up to `upTo`, and those in `beyond`. */
const arrivedSchema = z.object({ upTo: z.int(), beyond: z.array(z.int()) });

/** The whole state of a sequence, small enough to stand in its row and be carried forward entry by entry. */
export const foldStateSchema = z.object({
  state: z.enum(SEQUENCE_STATES),
  /** 1 until the first review, one more with each. */
  round: z.int(),
  headHash: sha256Schema,
  headPosition: z.int(),
  stepListHash: z.nullable(sha256Schema),
  steps: z.record(z.string(), stepFoldSchema),
  /** The newest change on the circuit that each device recorded; absent before the first. */
  changedAt: z.optional(
    z.record(z.string(), z.object({ at: z.iso.datetime(), entryId: entryIdSchema, stepKey: z.string() })),
  ),
  arrived: z.record(deviceIdSchema, arrivedSchema),
  /** Submissions that wait for what they rest on: one of each author, so that nobody's replaces another's. */
  pending: z.array(
    z.object({ entryId: entryIdSchema, authorId: personIdSchema, restsOn: z.array(restsOnSchema) }),
  ),
  /** Whose submission took effect last. */
  submittedBy: z.nullable(personIdSchema),
  /** Whoever recorded evidence or submitted it: none of them may approve. */
  recorders: z.array(personIdSchema),
  approvedHead: z.nullable(sha256Schema),
  lateCount: z.int(),
  heldCount: z.int(),
});
export type FoldState = z.infer<typeof foldStateSchema>;
