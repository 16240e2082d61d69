import * as z from 'zod/mini';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { typedValueSchema } from '../typed-value';
import { judgeSuperheatAnswer } from '../superheat-judging';

export const superheatStepSchema = z.object({
  kind: z.literal('superheat'),
  ...stepBaseShape,
  band: z.object({ lowK: z.number(), highK: z.number() }),
});

/** Suction pressure at the coil's outlet and line temperature at the bulb, read together. */
export const superheatPairSchema = z.object({ pressure: typedValueSchema, temperature: typedValueSchema });
export type SuperheatPair = z.infer<typeof superheatPairSchema>;

/** A steady valve needs one pair; a hunting one the pair at its lowest and the pair at its highest superheat. */
export const superheatObservationSchema = z.discriminatedUnion('valve', [
  z.object({ valve: z.literal('steady'), pair: superheatPairSchema }),
  z.object({ valve: z.literal('hunting'), low: superheatPairSchema, high: superheatPairSchema }),
]);
export type SuperheatObservation = z.infer<typeof superheatObservationSchema>;

export const superheatAnswerSchema = z.object({
  kind: z.literal('superheat'),
  /** Before the valve was touched; `null` where nobody looked, which a lead will ask about. */
  asFound: z.nullable(superheatObservationSchema),
  asLeft: superheatObservationSchema,
});

export type SuperheatStep = z.infer<typeof superheatStepSchema>;
export type SuperheatAnswer = z.infer<typeof superheatAnswerSchema>;

/** Superheat of one coil. The as-left observation is judged; the as-found one is worked out and kept beside it. */
export const superheatRules: StepRules<SuperheatStep, SuperheatAnswer> = { judge: judgeSuperheatAnswer };
