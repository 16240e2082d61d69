import * as z from 'zod/mini';
import { figureSchema, judgementSchema, OUTCOMES } from '../checklist/judgement';
import { signatureSchema } from '../checklist/signature';
import { answerSchema } from '../checklist/step';
import { textSchema } from '../checklist/text';
import { SEQUENCE_STATES } from './transitions';
import { deviceIdSchema, entryIdSchema, personIdSchema, sequenceIdSchema, sha256Schema } from '../plant/ids';

/** No device lives to make more; also what the database's integers hold. */
const MOST_ENTRIES = 2_000_000_000;

const stepKeySchema = z.string().check(z.minLength(1), z.maxLength(160));

export const VERDICTS = ['approved', 'sentBack', 'withdrawn'] as const;
export type Verdict = (typeof VERDICTS)[number];

export const remarkSchema = z.object({
  stepKey: stepKeySchema,
  text: z.string().check(z.minLength(1), z.maxLength(2000)),
});
export type Remark = z.infer<typeof remarkSchema>;

/** The device's entries that a submission rests on: it takes effect when entries 1 to `count` of each have arrived. */
export const restsOnSchema = z.object({ deviceId: deviceIdSchema, count: z.int().check(z.gte(0)) });
export type RestsOn = z.infer<typeof restsOnSchema>;

/** What was worked out on the device, beside what the server makes of it. */
const workedOutSchema = z.object({
  outcome: z.enum(OUTCOMES),
  counts: z.boolean(),
  figures: z.array(figureSchema),
});

/** What an entry says. The first three are made on a device, the last two by the server. */
export const entryContentSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('answer'),
    stepKey: stepKeySchema,
    answer: answerSchema,
    workedOut: workedOutSchema,
  }),
  z.object({
    kind: z.literal('notApplicable'),
    stepKey: stepKeySchema,
    reason: z.string().check(z.minLength(3), z.maxLength(500)),
  }),
  z.object({ kind: z.literal('submission'), restsOn: z.array(restsOnSchema).check(z.maxLength(50)) }),
  z.object({
    kind: z.literal('expansion'),
    templateKey: z.string(),
    templateVersion: z.int(),
    specificationRevision: z.int(),
    stepListHash: sha256Schema,
    /** Steps that ask or judge otherwise than before: what was recorded on them is asked again. */
    changedSteps: z.array(stepKeySchema).check(z.maxLength(2000)),
  }),
  z.object({
    kind: z.literal('review'),
    verdict: z.enum(VERDICTS),
    /** The head that the reviewer looked at and answers for. */
    headHash: sha256Schema,
    remarks: z.array(remarkSchema).check(z.maxLength(400)),
    signature: z.nullable(signatureSchema),
    meaning: z.nullable(textSchema),
  }),
]);
export type EntryContent = z.infer<typeof entryContentSchema>;

/**
 * One immutable record. `bodyHash` is the SHA-256 of its canonical JSON, so nothing in here can change on the way.
 *
 * `deviceCount` numbers all entries of the device, `countOnSequence` those on this sequence, both from 1 (0 for entries
 * that the server makes, whose `deviceId` is `null`). `supersedes` names the entry that the author saw on this step.
 */
export const entryBodySchema = z.object({
  format: z.literal(1),
  id: entryIdSchema,
  sequenceId: sequenceIdSchema,
  authorId: personIdSchema,
  deviceId: z.nullable(deviceIdSchema),
  deviceCount: z.int().check(z.gte(0), z.lte(MOST_ENTRIES)),
  countOnSequence: z.int().check(z.gte(0), z.lte(MOST_ENTRIES)),
  deviceTime: z.iso.datetime(),
  stepListHash: z.nullable(sha256Schema),
  supersedes: z.nullable(entryIdSchema),
  content: entryContentSchema,
});
export type EntryBody = z.infer<typeof entryBodySchema>;

/**
 * `inOrder`: part of the fold. `late`: it met an approved sequence and stands behind the approved head. `held`: its
 * author was no longer allowed when it arrived; a lead decides. All three are in the chain for good.
 */
export const STANDINGS = ['inOrder', 'late', 'held'] as const;
export type Standing = (typeof STANDINGS)[number];

/** What the server adds to a body when it appends it; together with the body it is what the chain's hash covers. */
export const serverPartSchema = z.object({
  position: z.int().check(z.gte(1)),
  standing: z.enum(STANDINGS),
  receivedAt: z.iso.datetime(),
  judgement: z.nullable(judgementSchema),
  judgingVersion: z.int(),
  /**
   * Where the sequence stood after this entry. A submission was measured against the steps that were asked then; who
   * folds the history later has other steps, so what came of it is part of the record.
   */
  stateAfter: z.enum(SEQUENCE_STATES),
});
export type ServerPart = z.infer<typeof serverPartSchema>;

export const storedEntrySchema = z.object({
  body: entryBodySchema,
  bodyHash: sha256Schema,
  server: serverPartSchema,
  previousHash: sha256Schema,
  hash: sha256Schema,
});
export type StoredEntry = z.infer<typeof storedEntrySchema>;
