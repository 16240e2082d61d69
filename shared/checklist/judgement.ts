import * as z from 'zod/mini';
import { UNITS, type UnitId } from '../units/unit';

const UNIT_IDS = Object.keys(UNITS) as [UnitId, ...UnitId[]];

export const OUTCOMES = ['within', 'outside', 'recorded', 'notApplicable'] as const;
export type Outcome = (typeof OUTCOMES)[number];

/**
 * Why an answer doesn't count, or what deserves a second look. `refuse`: a slip, which a phone doesn't offer to record
 * (one that arrives is kept all the same); `keep`: recorded on purpose, but the step stays open, such as a reading whose
 * conditions weren't met; `ask`: counts, and is shown to whoever recorded it and to the lead.
 */
export const DOUBT_KINDS = [
  'empty',
  'notANumber',
  'ambiguous',
  'notFinite',
  'wrongUnit',
  'belowAbsoluteZero',
  'deeperThanVacuum',
  'aboveCritical',
  'aboveTable',
  'belowTable',
  'notPlausible',
  'swapped',
  'celsiusInFahrenheit',
  'fahrenheitInCelsius',
  'liquidRisk',
  'unknownOption',
  'tooFewPhotos',
  'wrongAnswerKind',
  'unknownRefrigerant',
  'notNegatable',
  'lowAboveHigh',
  'emptySignature',
  'unknownStep',
  'incomplete',
  'tooMany',
  'noCriterion',
  'preliminary',
  'estimated',
  'tooFewSamples',
  'notSettled',
  'wrongRefrigerant',
  'massDoesNotFollow',
  'wrongWay',
  'readTooSoon',
  'barometerSeaLevel',
  'barometerFarOff',
  'asFoundMissing',
] as const;
export type DoubtKind = (typeof DOUBT_KINDS)[number];
export const doubtSchema = z.object({
  kind: z.enum(DOUBT_KINDS),
  severity: z.enum(['refuse', 'keep', 'ask']),
});
export type Doubt = z.infer<typeof doubtSchema>;

export const workingSchema = z.object({
  formula: z.string(),
  source: z.string(),
  lines: z.array(z.object({ label: z.string(), value: z.number(), unit: z.enum(UNIT_IDS) })),
});

/** A figure of a judgement, in SI, with the unit that says what it is. */
export const figureSchema = z.object({ label: z.string(), value: z.number(), unit: z.enum(UNIT_IDS) });
export type Figure = z.infer<typeof figureSchema>;

/** The limits that applied on the day, kept with the judgement whatever becomes of the specification. */
export const appliedLimitSchema = z.object({
  low: z.nullable(z.number()),
  high: z.nullable(z.number()),
  unit: z.enum(UNIT_IDS),
  source: z.string(),
});
export type AppliedLimit = z.infer<typeof appliedLimitSchema>;

export const judgementSchema = z.object({
  outcome: z.enum(OUTCOMES),
  /** What was concluded, as stable codes of `VERDICT_WORDS`, the main one first. Absent where the outcome says it all. */
  verdicts: z.optional(z.array(z.string().check(z.maxLength(60)))),
  /** On which side of its limits an `outside` lies; `null` where there is no side. */
  side: z.nullable(z.enum(['low', 'high'])),
  /** Whether the answer satisfies its step. An outside answer does: it is a true record, and the lead sees it first. */
  counts: z.boolean(),
  /** Whether it says that the circuit runs otherwise than before; part of the record, whatever a later template marks. */
  changes: z.optional(z.literal(true)),
  doubts: z.array(doubtSchema),
  figures: z.array(figureSchema),
  limit: z.nullable(appliedLimitSchema),
  working: z.array(workingSchema),
});
export type Judgement = z.infer<typeof judgementSchema>;

/** Whether an answer satisfies its step for all that was doubted about it. */
export const doubtsLetCount = (doubts: readonly Doubt[]): boolean =>
  doubts.every((doubt) => doubt.severity === 'ask');

/** A judgement with nothing to say beyond its outcome. */
export function plainJudgement(outcome: Outcome, doubts: readonly Doubt[] = []): Judgement {
  return {
    outcome,
    side: null,
    counts: doubtsLetCount(doubts),
    doubts: [...doubts],
    figures: [],
    limit: null,
    working: [],
  };
}

/** The judgement of an answer that can't be used, for the one reason given. The entry is kept, the step stays open. */
export function refusedJudgement(kind: DoubtKind): Judgement {
  return plainJudgement('recorded', [{ kind, severity: 'refuse' }]);
}
