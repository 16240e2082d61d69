import * as z from 'zod/mini';
import { jobListSchema } from '#shared/contracts/health';
import { defineRoute } from '../../http/define-route';
import type { JobsService } from '../jobs.service';

/** GET /jobs */
export const listJobs = (jobs: JobsService) =>
  defineRoute({
    method: 'get',
    path: '/jobs',
    summary: 'Background work of the company, newest first',
    access: { kind: 'action', action: 'job.read', subject: 'company' },
    query: z.object({
      after: z.optional(z.string().check(z.regex(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z_[0-9a-f-]{36}$/))),
      limit: z.optional(z.coerce.number().check(z.int(), z.gte(1), z.lte(200))),
    }),
    response: jobListSchema,
    handle: ({ caller, query }) => jobs.list(caller.person.companyId, query.limit ?? 50, query.after),
  });
