import * as z from 'zod/mini';

const partSchema = z.object({ up: z.boolean(), reason: z.nullable(z.string()) });

/** 200 when all parts are up, 503 with the reasons when one is not. */
export const healthSchema = z.object({
  up: z.boolean(),
  parts: z.object({ database: partSchema, files: partSchema, mail: partSchema }),
});
export type Health = z.infer<typeof healthSchema>;

export const jobSchema = z.object({
  id: z.string(),
  kind: z.string(),
  state: z.string(),
  attempts: z.int(),
  createdAt: z.iso.datetime(),
  runAfter: z.iso.datetime(),
  lastError: z.nullable(z.string()),
});
export const jobListSchema = z.object({ items: z.array(jobSchema), next: z.nullable(z.string()) });
