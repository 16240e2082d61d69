import * as z from 'zod/mini';
import { plainJudgement } from '../judgement';
import { changesShape, stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';

export const confirmStepSchema = z.object({
  kind: z.literal('confirm'),
  ...stepBaseShape,
  ...changesShape,
});
export const confirmAnswerSchema = z.object({ kind: z.literal('confirm'), confirmed: z.literal(true) });

/** Something looked at and found so. What isn't so is recorded as not applicable with its reason, or left open. */
export const confirmRules: StepRules<
  z.infer<typeof confirmStepSchema>,
  z.infer<typeof confirmAnswerSchema>
> = {
  judge: () => plainJudgement('recorded'),
};
