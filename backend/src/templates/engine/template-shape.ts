import * as z from 'zod/mini';
import { LEVELS } from '#shared/plant/words';
import { expressionShape, keyShape, stepShape, titleShape } from './step-shape';

/** A section as written: steps that belong together, in working order. */
export const sectionShape = z.strictObject({
  key: keyShape,
  title: titleShape,
  when: z.optional(expressionShape),
  steps: z.array(stepShape).check(z.minLength(1), z.maxLength(200)),
});

/** A template as written, for circuits or for the own work of suction groups or systems. */
export const templateShape = z.strictObject({
  key: keyShape,
  version: z.int().check(z.gte(1), z.lte(1_000_000)),
  level: z.enum(LEVELS),
  title: titleShape,
  applies: expressionShape,
  priority: z.int().check(z.gte(0), z.lte(1000)),
  sections: z.array(sectionShape).check(z.minLength(1), z.maxLength(50)),
});
export type WrittenTemplate = z.infer<typeof templateShape>;
