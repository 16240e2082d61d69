import * as z from 'zod/mini';
import { UNIT_SYSTEMS } from '../plant/plant';

/** What judging needs to know beyond the step, fixed when the sequence was expanded. */
export const sequenceFactsSchema = z.object({
  refrigerant: z.string(),
  /** Local atmosphere at the store's elevation: a gauge reads against it. */
  atmospherePaAbs: z.number(),
  elevationM: z.number(),
  unitSystem: z.enum(UNIT_SYSTEMS),
});
export type SequenceFacts = z.infer<typeof sequenceFactsSchema>;
