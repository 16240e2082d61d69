import * as z from 'zod/mini';
import { plainJudgement, refusedJudgement } from '../judgement';
import { isSigned, signatureSchema } from '../signature';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { textSchema } from '../text';

export const signatureStepSchema = z.object({
  kind: z.literal('signature'),
  ...stepBaseShape,
  /** What signing means, shown above the box and printed under the signature (21 CFR 11.50(a)(3)). */
  meaning: textSchema,
});
export const signatureAnswerSchema = z.object({ kind: z.literal('signature'), signature: signatureSchema });

/** A name under the work. One made without a network says so where it is shown. */
export const signatureRules: StepRules<
  z.infer<typeof signatureStepSchema>,
  z.infer<typeof signatureAnswerSchema>
> = {
  judge: (_step, answer) =>
    isSigned(answer.signature) ? plainJudgement('recorded') : refusedJudgement('emptySignature'),
};
