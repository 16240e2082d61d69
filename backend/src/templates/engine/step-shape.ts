import * as z from 'zod/mini';
import { METHOD_KEYS } from '#shared/checklist/methods/method-keys';
import { HAZARDS } from '#shared/checklist/text';
import { DIMENSIONS } from './si-unit';

// What a template may hold, as written; the names are those of the YAML keys. `template.schema.json` says the same to
// editors, and a spec holds the two together.

/** A section's or step's key: part of every step key of every sequence, so it never changes once it was used. */
export const keyShape = z.string().check(z.regex(/^[a-z][a-z0-9-]{0,59}$/));

const sentence = (most: number) => z.string().check(z.minLength(1), z.maxLength(most));
const both = (most: number) => z.strictObject({ en: sentence(most), es: sentence(most) });

/** A title in both languages. */
export const titleShape = both(120);

/** A CEL expression; its length is checked where it is compiled. */
export const expressionShape = z.string().check(z.minLength(1));

/** What steps are repeated for; a step without it is there once. */
export const REPEATS = ['fixture', 'coil'] as const;

const base = {
  key: keyShape,
  for_each: z.optional(z.enum(REPEATS)),
  when: z.optional(expressionShape),
  title: titleShape,
  instruction: z.optional(both(600)),
  caution: z.optional(z.strictObject({ hazard: z.enum(HAZARDS), text: both(300) })),
  required: z.optional(z.boolean()),
  source: z.optional(sentence(200)),
} as const;

/** A number with its unit, or an expression over the specification that gives such a quantity. */
const limitShape = z.string().check(z.minLength(1));

const optionShape = z.strictObject({
  value: keyShape,
  label: titleShape,
  outcome: z.enum(['within', 'outside', 'recorded']),
  changes: z.optional(z.boolean()),
});

/** Whether recording the step means that the coils run otherwise now: what was read on them before turns stale. */
const changes = z.optional(z.boolean());

const stepShapes = {
  confirm: z.strictObject({ kind: z.literal('confirm'), ...base, changes }),
  choose: z.strictObject({
    kind: z.literal('choose'),
    ...base,
    options: z.array(optionShape).check(z.minLength(2), z.maxLength(8)),
  }),
  reading: z.strictObject({
    kind: z.literal('reading'),
    ...base,
    changes,
    dimension: z.enum(DIMENSIONS),
    limits: z.optional(z.strictObject({ low: z.optional(limitShape), high: z.optional(limitShape) })),
  }),
  superheat: z.strictObject({
    kind: z.literal('superheat'),
    ...base,
    band: z.optional(z.strictObject({ low: limitShape, high: limitShape })),
    judged_by: z.optional(z.enum(['midpoint', 'time_weighted'])),
    wait: z.optional(limitShape),
  }),
  measurement: z.strictObject({
    kind: z.literal('measurement'),
    ...base,
    changes,
    method: z.enum(METHOD_KEYS),
    criteria: z.optional(z.record(z.string(), limitShape)),
  }),
  trend: z.strictObject({
    kind: z.literal('trend'),
    ...base,
    band: z.strictObject({ low: z.optional(limitShape), high: limitShape }),
    hold: limitShape,
    longest_excursion: z.optional(limitShape),
  }),
  photo: z.strictObject({
    kind: z.literal('photo'),
    ...base,
    min_count: z.int().check(z.gte(1), z.lte(20)),
  }),
  note: z.strictObject({ kind: z.literal('note'), ...base }),
  override: z.strictObject({ kind: z.literal('override'), ...base, subject: titleShape }),
  signature: z.strictObject({ kind: z.literal('signature'), ...base, meaning: both(400) }),
} as const;

/** A step as written, of one of the closed set of kinds. */
export const stepShape = z.discriminatedUnion('kind', [
  stepShapes.confirm,
  stepShapes.choose,
  stepShapes.reading,
  stepShapes.superheat,
  stepShapes.measurement,
  stepShapes.trend,
  stepShapes.photo,
  stepShapes.note,
  stepShapes.override,
  stepShapes.signature,
]);
export type WrittenStep = z.infer<typeof stepShape>;
export type WrittenText = z.infer<typeof titleShape>;

/** The keys that a step of each kind may have, for the spec that compares them with the JSON Schema. */
export const STEP_KEYS: Readonly<Record<WrittenStep['kind'], readonly string[]>> = {
  confirm: Object.keys(stepShapes.confirm.shape),
  choose: Object.keys(stepShapes.choose.shape),
  reading: Object.keys(stepShapes.reading.shape),
  superheat: Object.keys(stepShapes.superheat.shape),
  measurement: Object.keys(stepShapes.measurement.shape),
  trend: Object.keys(stepShapes.trend.shape),
  photo: Object.keys(stepShapes.photo.shape),
  note: Object.keys(stepShapes.note.shape),
  override: Object.keys(stepShapes.override.shape),
  signature: Object.keys(stepShapes.signature.shape),
};
