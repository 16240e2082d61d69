import * as z from 'zod/mini';
import { UNIT_SYSTEMS } from '../plant/plant';
import { SAFETY_CLASSES } from '../refrigeration/saturation/saturation-table';

/** A refrigerant maker's own pressure–temperature table, as the company entered it. Pressures absolute. */
export const makersTableSchema = z.object({
  designation: z.string().check(z.minLength(1), z.maxLength(40)),
  issuer: z.string().check(z.minLength(1), z.maxLength(120)),
  edition: z.string().check(z.maxLength(120)),
  /** The last digit of the printed pressures. */
  printedStepPa: z.number(),
  /** What keeps a flammable refrigerant from passing for a harmless one: the program knows nothing else of it. */
  safetyClass: z.enum(SAFETY_CLASSES),
  points: z
    .array(z.object({ temperatureK: z.number(), bubblePa: z.number(), dewPa: z.number() }))
    .check(z.maxLength(400)),
});
export type MakersTableFacts = z.infer<typeof makersTableSchema>;

/** What judging needs to know beyond the step, fixed when the sequence was expanded. */
export const sequenceFactsSchema = z.object({
  refrigerant: z.string(),
  /** Where the company works by the maker's table; absent: by the program's own figures. */
  makersTable: z.optional(makersTableSchema),
  /** Local atmosphere at the store's elevation: a gauge reads against it. */
  atmospherePaAbs: z.number(),
  elevationM: z.number(),
  unitSystem: z.enum(UNIT_SYSTEMS),
});
export type SequenceFacts = z.infer<typeof sequenceFactsSchema>;
