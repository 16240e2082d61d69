import * as z from 'zod/mini';
import { scheduleReasonSchema } from './schedule-reasons';

/**
 * One thing wrong with a schedule: the line of the file (the headings are line 1), the column by its heading there, and
 * why. `message` says the same in one English sentence, for clients without words for the reason's code.
 */
export const scheduleProblemSchema = z.object({
  row: z.int(),
  column: z.nullable(z.string()),
  reason: scheduleReasonSchema,
  message: z.string(),
});
export type ScheduleProblem = z.infer<typeof scheduleProblemSchema>;

/** What was read, before or after it was stored. Refused schedules come as a problem with `facts.rows`. */
export const scheduleImportSchema = z.object({
  stored: z.boolean(),
  revision: z.int(),
  systems: z.int(),
  suctionGroups: z.int(),
  circuits: z.int(),
  fixtures: z.int(),
  coils: z.int(),
  sequences: z.int(),
});
export type ScheduleImport = z.infer<typeof scheduleImportSchema>;
