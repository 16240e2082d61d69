import * as z from 'zod/mini';
import { plainJudgement, refusedJudgement } from '../judgement';
import { changesShape, stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { textSchema } from '../text';

export const chooseStepSchema = z.object({
  kind: z.literal('choose'),
  ...stepBaseShape,
  options: z
    .array(
      z.object({
        value: z.string(),
        label: textSchema,
        outcome: z.enum(['within', 'outside', 'recorded']),
        ...changesShape,
      }),
    )
    .check(z.minLength(2)),
});
export const chooseAnswerSchema = z.object({
  kind: z.literal('choose'),
  value: z.string().check(z.maxLength(80)),
});

/** One of a few named findings; the template says which of them lie within. */
export const chooseRules: StepRules<z.infer<typeof chooseStepSchema>, z.infer<typeof chooseAnswerSchema>> = {
  judge(step, answer) {
    const option = step.options.find((candidate) => candidate.value === answer.value);
    return option ? plainJudgement(option.outcome) : refusedJudgement('unknownOption');
  },
};
