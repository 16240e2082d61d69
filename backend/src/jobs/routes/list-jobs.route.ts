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
      after: z.optional(z.iso.datetime()),
      limit: z.optional(z.coerce.number().check(z.int(), z.gte(1), z.lte(200))),
    }),
    response: jobListSchema,
    handle: ({ caller, query }) => jobs.list(caller.person.companyId, query.limit ?? 50, query.after),
  });
