import * as z from 'zod/mini';
import { FAILURE_CODES } from '../failures/failure';

/** RFC 9457, media type application/problem+json. `code` is what a client acts on; `detail` is one English sentence. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.enum([...FAILURE_CODES, 'temporary', 'bug']),
  places: z.array(z.object({ path: z.string(), message: z.string() })),
  facts: z.record(z.string(), z.unknown()),
  requestId: z.string(),
});
export type Problem = z.infer<typeof problemSchema>;
