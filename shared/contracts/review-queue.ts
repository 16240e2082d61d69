import * as z from 'zod/mini';
import { circuitIdSchema, openingIdSchema, sequenceIdSchema } from '../plant/ids';
import { LEVELS } from '../plant/words';
import { pageOf } from './paging';

/** One submitted sequence that waits for a lead, with what there is to look at. */
export const queueItemSchema = z.object({
  sequenceId: sequenceIdSchema,
  circuitId: circuitIdSchema,
  level: z.enum(LEVELS),
  openingId: openingIdSchema,
  openingName: z.string(),
  /** Of the opening: times are told as they were on site. */
  timeZone: z.string(),
  openingDate: z.iso.date(),
  code: z.string(),
  description: z.string(),
  area: z.string(),
  submittedAt: z.iso.datetime(),
  submittedBy: z.string(),
  round: z.int(),
  stepsTotal: z.int(),
  outsideCount: z.int(),
  notApplicableCount: z.int(),
  answeredTwiceCount: z.int(),
  photoCount: z.int(),
  lateCount: z.int(),
  /** Whether this reader recorded some of it and therefore can't approve it. */
  fourEyesBlocked: z.boolean(),
});
export type QueueItem = z.infer<typeof queueItemSchema>;
export const queueSchema = pageOf(queueItemSchema);
