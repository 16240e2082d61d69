import * as z from 'zod/mini';
import { judgeMeasurement } from '../methods/judge-measurement';
import { METHOD_KEYS } from '../methods/method-keys';
import { changesShape, stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { typedValueSchema } from '../typed-value';

const FIELD_KEY = z.string().check(z.maxLength(40));

/** Several values that are worked out together by a named method: a pressure test, an evacuation, return gas … */
export const measurementStepSchema = z.object({
  kind: z.literal('measurement'),
  ...stepBaseShape,
  ...changesShape,
  method: z.enum(METHOD_KEYS),
  /** What the method judges by, SI, by the keys that it declares. */
  criteria: z.record(FIELD_KEY, z.nullable(z.number())),
});

/** The boxes of one row as they were typed: quantities with the unit beside them, and words. */
const boxesSchema = z.object({
  quantities: z.record(FIELD_KEY, typedValueSchema),
  words: z.record(FIELD_KEY, z.string().check(z.maxLength(200))),
});
export type MeasurementBoxes = z.infer<typeof boxesSchema>;

export const measurementAnswerSchema = z.object({
  kind: z.literal('measurement'),
  method: z.enum(METHOD_KEYS),
  ...boxesSchema.shape,
  rows: z.array(boxesSchema).check(z.maxLength(200)),
});

export type MeasurementStep = z.infer<typeof measurementStepSchema>;
export type MeasurementAnswer = z.infer<typeof measurementAnswerSchema>;

/** What was typed is kept whatever comes of it; the method works the rest out. */
export const measurementRules: StepRules<MeasurementStep, MeasurementAnswer> = { judge: judgeMeasurement };
