import * as z from 'zod/mini';
import { trendAnswerSchema, trendStepSchema } from './kinds/trend';
import { chooseAnswerSchema, chooseStepSchema } from './kinds/choose';
import { confirmAnswerSchema, confirmStepSchema } from './kinds/confirm';
import { measurementAnswerSchema, measurementStepSchema } from './kinds/measurement';
import { noteAnswerSchema, noteStepSchema } from './kinds/note';
import { overrideAnswerSchema, overrideStepSchema } from './kinds/override';
import { photoAnswerSchema, photoStepSchema } from './kinds/photo';
import { readingAnswerSchema, readingStepSchema } from './kinds/reading';
import { signatureAnswerSchema, signatureStepSchema } from './kinds/signature';
import { superheatAnswerSchema, superheatStepSchema } from './kinds/superheat';
import { circuitSpecificationSchema } from '../plant/plant';
import { sequenceFactsSchema } from './facts';
import { textSchema } from './text';

/** One thing to do and prove. A new kind is one file in `kinds/`, one line in each list here, and one component. */
export const stepSchema = z.discriminatedUnion('kind', [
  confirmStepSchema,
  chooseStepSchema,
  readingStepSchema,
  superheatStepSchema,
  measurementStepSchema,
  trendStepSchema,
  photoStepSchema,
  noteStepSchema,
  overrideStepSchema,
  signatureStepSchema,
]);
export type Step = z.infer<typeof stepSchema>;
export type StepKind = Step['kind'];
export type StepOf<K extends StepKind> = Extract<Step, { kind: K }>;

export const answerSchema = z.discriminatedUnion('kind', [
  confirmAnswerSchema,
  chooseAnswerSchema,
  readingAnswerSchema,
  superheatAnswerSchema,
  measurementAnswerSchema,
  trendAnswerSchema,
  photoAnswerSchema,
  noteAnswerSchema,
  overrideAnswerSchema,
  signatureAnswerSchema,
]);
export type Answer = z.infer<typeof answerSchema>;
export type AnswerOf<K extends StepKind> = Extract<Answer, { kind: K }>;

export const sectionSchema = z.object({ key: z.string(), title: textSchema });
export type Section = z.infer<typeof sectionSchema>;

/** What a template version made of one circuit: the exact steps, in working order, and the facts they are judged by. */
export const stepListSchema = z.object({
  format: z.literal(1),
  template: z.object({ key: z.string(), version: z.int(), title: textSchema }),
  facts: sequenceFactsSchema,
  sections: z.array(sectionSchema),
  steps: z.array(stepSchema),
});
export type StepList = z.infer<typeof stepListSchema>;

/**
 * What one expansion binds: the steps, and the specification that they were made from. A schedule may say something
 * else by tomorrow; what was asked and approved stays as it was.
 */
export const expansionDocumentSchema = z.object({
  stepList: stepListSchema,
  specification: circuitSpecificationSchema,
});
export type ExpansionDocument = z.infer<typeof expansionDocumentSchema>;
