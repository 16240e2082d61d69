import * as z from 'zod/mini';
import { stepListSchema } from '../checklist/step';
import { openingIdSchema, personIdSchema, sequenceIdSchema, sha256Schema } from '../plant/ids';
import { circuitSpecificationSchema } from '../plant/plant';
import { storedEntrySchema, STANDINGS } from '../sequences/entry';
import { foldStateSchema } from '../sequences/fold-state';
import { judgementSchema } from '../checklist/judgement';
import { signatureSchema } from '../checklist/signature';
import { remarkSchema } from '../sequences/entry';

export const PHOTO_STATES = ['awaited', 'received', 'checked', 'broken'] as const;

/** `awaited`: an entry names it, its bytes aren't here yet. `checked`: decoded fully, thumbnail made. */
export const photoStatusSchema = z.object({ sha256: sha256Schema, state: z.enum(PHOTO_STATES) });

/** One sequence, whole: enough to work on it, or review it, without asking again. */
export const sequenceDetailSchema = z.object({
  id: sequenceIdSchema,
  openingId: openingIdSchema,
  openingName: z.string(),
  timeZone: z.string(),
  specification: circuitSpecificationSchema,
  stepList: stepListSchema,
  stepListHash: sha256Schema,
  fold: foldStateSchema,
  entries: z.array(storedEntrySchema),
  people: z.array(z.object({ id: personIdSchema, name: z.string() })),
  photos: z.array(photoStatusSchema),
});
export type SequenceDetail = z.infer<typeof sequenceDetailSchema>;

/** Batch of entries as they leave a device; each is checked by itself, so one bad one holds up no other. */
export const entryBatchSchema = z.strictObject({
  entries: z
    .array(z.strictObject({ body: z.unknown(), bodyHash: sha256Schema }))
    .check(z.minLength(1), z.maxLength(50)),
});

/**
 * Why an entry is not taken. `unknown` is what a phone reads whose page is of another version than the server, so that
 * one refusal that it doesn't know keeps it from no other result.
 */
export const ENTRY_REFUSALS = [
  'notAnEntry',
  'changedOnTheWay',
  'otherAuthor',
  'serverOnly',
  'unknownDevice',
  'idTaken',
  'noSuchSequence',
  'twiceInBatch',
  'unknown',
] as const;

/** `path`: the field of the entry that isn't as documented, where it is one. */
export const entryRefusalSchema = z.object({
  code: z.enum(ENTRY_REFUSALS),
  params: z.object({ path: z.optional(z.string()) }),
});
export type EntryRefusal = z.infer<typeof entryRefusalSchema>;

/**
 * What became of one entry. `stored` and `alreadyStored` are final; `refused` means that it isn't an entry of this
 * person on anything they ever could see, and only a person can put that right. `message` says why in an English
 * sentence, for clients without words for the reason's code.
 */
export const entryResultSchema = z.discriminatedUnion('result', [
  z.object({
    result: z.enum(['stored', 'alreadyStored']),
    id: z.string(),
    position: z.int(),
    standing: z.enum(STANDINGS),
    judgement: z.nullable(judgementSchema),
    hash: sha256Schema,
    state: foldStateSchema.shape.state,
  }),
  z.object({
    result: z.literal('refused'),
    id: z.nullable(z.string()),
    reason: z.catch(entryRefusalSchema, { code: 'unknown', params: {} }),
    message: z.string(),
  }),
]);
export type EntryResult = z.infer<typeof entryResultSchema>;
export const entryBatchResponseSchema = z.object({ results: z.array(entryResultSchema) });

export const photoStoredSchema = z.object({ sha256: sha256Schema, alreadyThere: z.boolean() });

export const reviewRequestSchema = z.discriminatedUnion('verdict', [
  z.strictObject({ verdict: z.literal('approved'), headHash: sha256Schema, signature: signatureSchema }),
  z.strictObject({
    verdict: z.literal('sentBack'),
    headHash: sha256Schema,
    remarks: z.array(remarkSchema).check(z.minLength(1), z.maxLength(400)),
  }),
]);
export type ReviewRequest = z.infer<typeof reviewRequestSchema>;
export const reviewResponseSchema = z.object({ state: foldStateSchema.shape.state, headHash: sha256Schema });
