import * as z from 'zod/mini';
import { circuitIdSchema, openingIdSchema, suctionGroupIdSchema } from '../plant/ids';
import { UNIT_SYSTEMS } from '../plant/plant';
import { DEFROST_TYPES } from '../plant/words';
import { LOOSENABLE_DEFROST_RULES, type DefrostRules } from '../refrigeration/defrost/defrost-plan-types';

/** Four times what anybody sets; the same bound as the planner's. */
const MOST_STARTS = 24;
const MOST_CIRCUITS = 500;
const DAY_S = 86_400;

const secondOfDay = z.int().check(z.gte(0), z.lt(DAY_S));
const amount = z.number().check(z.gte(0), z.lte(1e9));
const share = z.number().check(z.gt(0), z.lte(1));
/** One line in a person's own words; two circuits share what is written the same way. */
const shared = z
  .string()
  .check(z.trim(), z.minLength(1), z.maxLength(60), z.regex(/^[^\p{Cc}]*$/u, 'must be one line'));

/** What the schedule says of a circuit, as far as a defrost plan asks. `null`: the schedule is silent. */
export const scheduledDefrostSchema = z.object({
  id: circuitIdSchema,
  code: z.string(),
  description: z.string(),
  systemName: z.string(),
  groupId: suctionGroupIdSchema,
  groupName: z.string(),
  type: z.enum(DEFROST_TYPES),
  perDay: z.int(),
  failSafeS: z.nullable(z.number()),
  dripS: z.nullable(z.number()),
  loadW: z.nullable(z.number()),
  /** What its walk-in fixtures are called; the schedule doesn't say which circuits feed one box together. */
  walkIns: z.array(z.string()),
});
export type ScheduledDefrost = z.infer<typeof scheduledDefrostSchema>;

/** What a lead adds to the schedule by hand. A figure given here goes before the schedule's. */
export const defrostDetailsSchema = z.strictObject({
  circuitId: circuitIdSchema,
  durationS: z.nullable(z.number().check(z.gt(0), z.lte(DAY_S))),
  dripS: z.nullable(z.number().check(z.gte(0), z.lte(DAY_S))),
  loadW: z.nullable(amount),
  heaterW: z.nullable(amount),
  box: z.nullable(shared),
  airCurtain: z.nullable(shared),
  /** Starts that stay where they are when the day is laid out again. */
  fixedStartsS: z.array(secondOfDay).check(z.maxLength(MOST_STARTS)),
});
export type DefrostDetails = z.infer<typeof defrostDetailsSchema>;

export const defrostRulesSchema = z.strictObject({
  largestShareOfLoad: share,
  largestShareInHotGas: share,
  leastRunningLoadForHotGasW: z.nullable(amount),
  leastRunningShareForHotGas: z.nullable(z.number().check(z.gte(0), z.lte(1))),
  leastGapBetweenStartsS: z.number().check(z.gte(0), z.lt(DAY_S)),
  quietHours: z
    .array(
      z.strictObject({
        fromS: z.int().check(z.gte(0), z.lte(DAY_S)),
        toS: z.int().check(z.gte(0), z.lte(DAY_S)),
      }),
    )
    .check(z.maxLength(6)),
  largestHeaterDemandW: z.nullable(amount),
  stepS: z.int().check(z.gte(300), z.lte(DAY_S)),
}) satisfies z.ZodMiniType<DefrostRules>;

/** Of all circuits: a store of 200 circuits with six defrosts a day each has 1,200. */
const MOST_STARTS_IN_ALL = 1500;

const startsSchema = z.strictObject({
  circuitId: circuitIdSchema,
  startsS: z.array(secondOfDay).check(z.maxLength(MOST_STARTS)),
});

/** `basedOn`: the version that the lead had before them, 0 for none; another one saved meanwhile refuses this. */
export const defrostPlanRequestSchema = z.strictObject({
  basedOn: z.int().check(z.gte(0)),
  rules: defrostRulesSchema,
  details: z.array(defrostDetailsSchema).check(z.maxLength(MOST_CIRCUITS)),
  plan: z.array(startsSchema).check(
    z.maxLength(MOST_CIRCUITS),
    z.refine((plan) => new Set(plan.map(({ circuitId }) => circuitId)).size === plan.length),
    // Checking looks at every start beside every other.
    z.refine((plan) => plan.reduce((sum, { startsS }) => sum + startsS.length, 0) <= MOST_STARTS_IN_ALL),
  ),
});
export type DefrostPlanRequest = z.infer<typeof defrostPlanRequestSchema>;

/** A circuit as the plan was checked with: schedule and details in one. Kept with the plan, since schedules change. */
export const plannedCircuitSchema = z.object({
  id: circuitIdSchema,
  code: z.string(),
  groupId: suctionGroupIdSchema,
  groupName: z.string(),
  type: z.enum(DEFROST_TYPES),
  perDay: z.int(),
  durationS: z.number(),
  dripS: z.number(),
  loadW: z.nullable(z.number()),
  heaterW: z.nullable(z.number()),
  box: z.nullable(z.string()),
  airCurtain: z.nullable(z.string()),
  fixedStartsS: z.array(z.number()),
});
export type PlannedCircuit = z.infer<typeof plannedCircuitSchema>;

export const DEFROST_RULES = [
  ...LOOSENABLE_DEFROST_RULES,
  'tooClose',
  'startsPerDay',
  'startOutsideDay',
  'unknownCircuit',
] as const;
export const DEFROST_NOTES = ['aloneOverShare', 'aloneOverHotGasShare', 'judgedByCount'] as const;

const findingShape = {
  circuitIds: z.array(z.string()),
  atS: z.nullable(z.number()),
  value: z.nullable(z.number()),
  limit: z.nullable(z.number()),
};
export const defrostBreachSchema = z.object({ rule: z.enum(DEFROST_RULES), ...findingShape });
export const defrostNoteSchema = z.object({ note: z.enum(DEFROST_NOTES), ...findingShape });

export const savedDefrostPlanSchema = z.object({
  id: z.uuid(),
  version: z.int(),
  rules: defrostRulesSchema,
  details: z.array(defrostDetailsSchema),
  circuits: z.array(plannedCircuitSchema),
  plan: z.array(startsSchema),
  breaches: z.array(defrostBreachSchema),
  notes: z.array(defrostNoteSchema),
  createdAt: z.iso.datetime(),
  createdByName: z.string(),
});
export type SavedDefrostPlan = z.infer<typeof savedDefrostPlanSchema>;

/** The newest plan of an opening, and the circuits of its schedule as they stand now. */
export const defrostPlanPageSchema = z.object({
  opening: z.object({
    id: openingIdSchema,
    name: z.string(),
    timeZone: z.string(),
    unitSystem: z.enum(UNIT_SYSTEMS),
  }),
  circuits: z.array(scheduledDefrostSchema),
  newest: z.nullable(savedDefrostPlanSchema),
});
export type DefrostPlanPage = z.infer<typeof defrostPlanPageSchema>;
