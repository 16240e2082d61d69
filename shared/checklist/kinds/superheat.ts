import * as z from 'zod/mini';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';
import { typedValueSchema } from '../typed-value';
import { SUPERHEAT_CONDITIONS } from '../superheat-conditions';
import { judgeSuperheatAnswer } from '../superheat-judging';
import { logFileSchema, samplesOf, timeSchema } from './trend';

export const superheatStepSchema = z.object({
  kind: z.literal('superheat'),
  ...stepBaseShape,
  band: z.object({ lowK: z.number(), highK: z.number() }),
  /** Which mean of a hunting valve is held against the band; absent: the middle between high and low. */
  judgedBy: z.optional(z.enum(['midpoint', 'timeWeighted'])),
  /** Seconds between the last turn of the valve and the reading that counts; absent: `DEFAULT_WAIT_S`. */
  waitS: z.optional(z.number()),
});

/** Suction pressure at the coil's outlet and line temperature at the bulb, read together. */
export const superheatPairSchema = z.object({ pressure: typedValueSchema, temperature: typedValueSchema });
export type SuperheatPair = z.infer<typeof superheatPairSchema>;

/** One pair of a series typed at intervals; `atS` counts from the first. */
const timedPairSchema = z.object({ atS: timeSchema, ...superheatPairSchema.shape });

/**
 * A steady valve needs one pair; a hunting one the pair at its lowest and the pair at its highest superheat, or a
 * series: typed at intervals, or a data logger's (SI, reduced so that no extreme is lost, with the file's name and hash).
 */
export const superheatObservationSchema = z.discriminatedUnion('valve', [
  z.object({ valve: z.literal('steady'), pair: superheatPairSchema }),
  z.object({ valve: z.literal('hunting'), low: superheatPairSchema, high: superheatPairSchema }),
  z.object({ valve: z.literal('series'), readings: z.array(timedPairSchema).check(z.maxLength(200)) }),
  z.object({
    valve: z.literal('log'),
    file: logFileSchema,
    atS: samplesOf(timeSchema),
    pressurePag: samplesOf(z.number().check(z.gte(-1e7), z.lte(1e9))),
    temperatureK: samplesOf(z.number().check(z.gte(-1000), z.lte(10_000))),
  }),
]);
export type SuperheatObservation = z.infer<typeof superheatObservationSchema>;

/** One turn of the valve's stem. `at` is the phone's clock; order on one phone never depends on another's. */
export const valveTurnSchema = z.object({
  turns: z.number().check(z.gt(0), z.lte(20)),
  direction: z.enum(['clockwise', 'counterclockwise']),
  at: z.iso.datetime(),
});
export type ValveTurn = z.infer<typeof valveTurnSchema>;

export { DEFAULT_WAIT_S, SUPERHEAT_CONDITIONS, type SuperheatCondition } from '../superheat-conditions';

export const GAUGE_KINDS = ['vented', 'sealed', 'absolute'] as const;

/** What the reading was taken with; the accuracies as their makers state them. */
export const superheatInstrumentsSchema = z.object({
  gauge: z.enum(GAUGE_KINDS),
  pressureAccuracy: z.nullable(typedValueSchema),
  temperatureAccuracy: z.nullable(typedValueSchema),
  /** The station pressure on a barometer at the store, where somebody read one; else the elevation's standard atmosphere counts. */
  barometer: z.optional(z.nullable(typedValueSchema)),
});

export const superheatAnswerSchema = z.object({
  kind: z.literal('superheat'),
  /** Before the valve was touched; `null` where nobody looked, which a lead will ask about. */
  asFound: z.nullable(superheatObservationSchema),
  asLeft: superheatObservationSchema,
  /** Where the pressure was read; absent in answers of the first release: at the coil's outlet. */
  takenAt: z.optional(z.enum(['coilOutlet', 'elsewhere'])),
  /** What the line loses between the coil and the tap, when it was read elsewhere. */
  lineDrop: z.optional(z.nullable(typedValueSchema)),
  /** Turns of the stem between as-found and as-left, oldest first. */
  turns: z.optional(z.array(valveTurnSchema).check(z.maxLength(50))),
  /** What turning clockwise does by the valve's own sheet; makers differ, so `null` where nobody looked it up. */
  clockwise: z.optional(z.nullable(z.enum(['raisesSuperheat', 'lowersSuperheat']))),
  /** Seconds from the last turn to the as-left reading, by the phone that took both; absent without turns. */
  waitedS: z.optional(timeSchema),
  /** Those of the conditions that were met. Absent in answers of the first release: not asked. */
  conditions: z.optional(
    z.array(z.enum(SUPERHEAT_CONDITIONS)).check(z.maxLength(SUPERHEAT_CONDITIONS.length)),
  ),
  instruments: z.optional(superheatInstrumentsSchema),
});

export type SuperheatStep = z.infer<typeof superheatStepSchema>;
export type SuperheatAnswer = z.infer<typeof superheatAnswerSchema>;

/** Superheat of one coil. The as-left observation is judged; the as-found one is worked out and kept beside it. */
export const superheatRules: StepRules<SuperheatStep, SuperheatAnswer> = { judge: judgeSuperheatAnswer };
