import * as z from 'zod/mini';
import { judgeTrend } from '../trend-judging';
import { stepBaseShape } from '../step-base';
import type { StepRules } from '../step-rules';

/** Samples that an entry holds at most: a longer log is reduced so that no extreme is lost. */
export const MOST_SAMPLES = 6000;

/** Seconds of a log or a series, from its first: three years at most, so that no sum of them loses its way. */
export const timeSchema = z.number().check(z.gte(0), z.lte(100_000_000));

/** As many numbers as an entry holds. */
export const samplesOf = (number: z.ZodMiniNumber) => z.array(number).check(z.maxLength(MOST_SAMPLES));

/** The data logger's file behind an answer: the answer holds what was judged, the hash says of which file it is. */
export const logFileSchema = z.object({
  name: z.string().check(z.maxLength(200)),
  sha256: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
  /** Rows that could be read in the file. */
  rows: z.int(),
});
export type LogFile = z.infer<typeof logFileSchema>;

/** A temperature over hours: pull-down into the band, and whether it held there. */
export const trendStepSchema = z.object({
  kind: z.literal('trend'),
  ...stepBaseShape,
  bandLowK: z.nullable(z.number()),
  bandHighK: z.number(),
  /** Seconds that it has to hold. */
  holdS: z.number(),
  /** The longest time above the band that doesn't start the hold again, in seconds; 0: none. */
  longestExcursionS: z.number(),
});

export const trendAnswerSchema = z.object({
  kind: z.literal('trend'),
  file: logFileSchema,
  /** The first row's time as the logger wrote it. */
  startText: z.string().check(z.maxLength(60)),
  /** Heading of the column that was judged. */
  column: z.string().check(z.maxLength(120)),
  /** Seconds from the first row, ascending, and the temperature at each in kelvin. */
  atS: samplesOf(timeSchema),
  temperatureK: samplesOf(z.number().check(z.gte(-1000), z.lte(10_000))),
});

export type TrendStep = z.infer<typeof trendStepSchema>;
export type TrendAnswer = z.infer<typeof trendAnswerSchema>;

/** The log of one fixture's air or product. */
export const trendRules: StepRules<TrendStep, TrendAnswer> = { judge: judgeTrend };
