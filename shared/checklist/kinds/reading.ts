import * as z from 'zod/mini';
import { UNITS, type Dimension, type UnitId } from '../../units/unit';
import { plainJudgement, refusedJudgement, type Judgement } from '../judgement';
import { physicalDoubt } from '../physical-range';
import { changesShape, stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { readTypedValue, typedValueSchema } from '../typed-value';

const UNIT_IDS = Object.keys(UNITS) as [UnitId, ...UnitId[]];
const DIMENSIONS = [...new Set(Object.values(UNITS).map((unit) => unit.dimension))] as [
  Dimension,
  ...Dimension[],
];

export const readingStepSchema = z.object({
  kind: z.literal('reading'),
  ...stepBaseShape,
  ...changesShape,
  dimension: z.enum(DIMENSIONS),
  /** SI. `null` on both sides: the value is recorded, nothing is judged. */
  limits: z.object({ low: z.nullable(z.number()), high: z.nullable(z.number()) }),
  /** The SI unit that `limits` are in. */
  siUnit: z.enum(UNIT_IDS),
});
export const readingAnswerSchema = z.object({ kind: z.literal('reading'), value: typedValueSchema });

type ReadingStep = z.infer<typeof readingStepSchema>;

/** A slack that absorbs binary fractions only: 41.0 °F typed against a limit of 41 °F is within. */
const EDGE = 1e-9;

/** One value with a unit, against limits from the template or the specification. An edge counts as within. */
export const readingRules: StepRules<ReadingStep, z.infer<typeof readingAnswerSchema>> = {
  judge(step, answer): Judgement {
    const read = readTypedValue(answer.value, step.dimension);
    if (!read.ok) return refusedJudgement(read.problem);
    const doubt = physicalDoubt(step.dimension, read.si);
    if (doubt) return refusedJudgement(doubt);
    const { low, high } = step.limits;
    const slack = EDGE * Math.max(1, Math.abs(read.si));
    const side =
      low !== null && read.si < low - slack ? 'low' : high !== null && read.si > high + slack ? 'high' : null;
    const judged = low !== null || high !== null;
    return {
      ...plainJudgement(judged ? (side ? 'outside' : 'within') : 'recorded'),
      side,
      figures: [{ label: 'value', value: read.si, unit: step.siUnit }],
      limit: judged ? { low, high, unit: step.siUnit, source: step.source ?? '' } : null,
    };
  },
};
