import * as z from 'zod/mini';
import { openingIdSchema, packageIdSchema, sequenceIdSchema } from '../plant/ids';

/** What the event stream says: a hint that something changed; whoever shows it reads it anew. */
export const liveEventSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('sequenceChanged'),
    openingId: openingIdSchema,
    sequenceId: sequenceIdSchema,
    state: z.string(),
  }),
  z.object({ kind: z.literal('packageChanged'), openingId: openingIdSchema, packageId: packageIdSchema }),
  z.object({ kind: z.literal('scheduleChanged'), openingId: openingIdSchema }),
]);
export type LiveEvent = z.infer<typeof liveEventSchema>;
