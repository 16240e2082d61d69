import * as z from 'zod/mini';
import { plainJudgement, refusedJudgement } from '../judgement';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';

export const noteStepSchema = z.object({ kind: z.literal('note'), ...stepBaseShape });
export const noteAnswerSchema = z.object({
  kind: z.literal('note'),
  text: z.string().check(z.maxLength(4000)),
});

/** Free words. */
export const noteRules: StepRules<z.infer<typeof noteStepSchema>, z.infer<typeof noteAnswerSchema>> = {
  judge: (_step, answer) =>
    answer.text.trim() === '' ? refusedJudgement('empty') : plainJudgement('recorded'),
};
