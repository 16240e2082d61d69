import * as z from 'zod/mini';
import { coilIdSchema, fixtureIdSchema } from '../plant/ids';
import { cautionSchema, textSchema } from './text';

/**
 * Whether what is recorded here means that the circuit runs otherwise than before (a regulator set, a set point moved):
 * superheats read earlier on the circuit turn stale and are asked again. Absent: no.
 */
export const changesShape = { changes: z.optional(z.literal(true)) } as const;

/**
 * What every step has. `key` is stable: the same template version and the same circuit give the same keys, and a key
 * holds the coil's or fixture's id, so that a swapped fixture gets steps of its own.
 */
export const stepBaseShape = {
  key: z.string().check(z.regex(/^[a-z0-9][a-z0-9.:_-]{0,159}$/i)),
  section: z.string(),
  title: textSchema,
  instruction: z.nullable(textSchema),
  caution: z.nullable(cautionSchema),
  fixtureId: z.nullable(fixtureIdSchema),
  coilId: z.nullable(coilIdSchema),
  /** Whether a submission needs it. A step that isn't required may stay open. */
  required: z.boolean(),
  /** Where the criterion comes from: a published source, or that it is common practice. `null` without a criterion. */
  source: z.nullable(z.string()),
} as const;
