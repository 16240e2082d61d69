import * as z from 'zod/mini';
import { plainJudgement } from '../judgement';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';

export const overrideStepSchema = z.object({
  kind: z.literal('override'),
  ...stepBaseShape,
  /** What is put by hand, as a noun: "Defrost held off". */
  subject: z.object({ en: z.string(), es: z.string() }),
});
export const overrideAnswerSchema = z.object({
  kind: z.literal('override'),
  phase: z.enum(['set', 'putBack']),
  remark: z.string().check(z.maxLength(500)),
});

/**
 * Something put by hand for the work. Setting it is recorded but leaves the step open: only putting it back satisfies
 * it, and no sequence is submitted while one stands.
 */
export const overrideRules: StepRules<
  z.infer<typeof overrideStepSchema>,
  z.infer<typeof overrideAnswerSchema>
> = {
  judge: (_step, answer) => ({ ...plainJudgement('recorded'), counts: answer.phase === 'putBack' }),
};
