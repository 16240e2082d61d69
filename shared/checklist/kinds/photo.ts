import * as z from 'zod/mini';
import { sha256Schema } from '../../plant/ids';
import { plainJudgement, refusedJudgement } from '../judgement';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';

export const photoStepSchema = z.object({
  kind: z.literal('photo'),
  ...stepBaseShape,
  minCount: z.int().check(z.gte(1), z.lte(20)),
});

/**
 * One photo as it was made on the phone. `sha256` is of exactly the bytes that are sent and stored; `originalSha256` of
 * the camera's file before it was shrunk, `null` when the picture did not come out of a file.
 */
export const photoRefSchema = z.object({
  sha256: sha256Schema,
  originalSha256: z.nullable(sha256Schema),
  bytes: z.int().check(z.gte(1), z.lte(15_000_000)),
  width: z.int().check(z.gte(1), z.lte(8192)),
  height: z.int().check(z.gte(1), z.lte(8192)),
  capturedAt: z.nullable(z.iso.datetime()),
});
export type PhotoRef = z.infer<typeof photoRefSchema>;

export const photoAnswerSchema = z.object({
  kind: z.literal('photo'),
  photos: z.array(photoRefSchema).check(z.minLength(1), z.maxLength(20)),
});

/** Photos as evidence. Whether each arrived and can be opened is the server's to find out, later than the entry. */
export const photoRules: StepRules<z.infer<typeof photoStepSchema>, z.infer<typeof photoAnswerSchema>> = {
  judge: (step, answer) =>
    new Set(answer.photos.map((photo) => photo.sha256)).size >= step.minCount
      ? plainJudgement('recorded')
      : refusedJudgement('tooFewPhotos'),
};
