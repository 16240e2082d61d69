import * as z from 'zod/mini';
import { openingListSchema } from '#shared/contracts/openings';
import { pageQueryShape } from '#shared/contracts/paging';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** GET /openings */
export const listOpenings = (openings: OpeningsService) =>
  defineRoute({
    method: 'get',
    path: '/openings',
    summary: 'The openings in which the caller has a role, soonest first',
    access: { kind: 'self', reason: 'Lists only the own openings.' },
    query: z.object(pageQueryShape),
    response: openingListSchema,
    handle: ({ caller, query }) => openings.list(caller.person, query.limit ?? 50, query.after),
  });
