import * as z from 'zod/mini';
import { circuitListSchema } from '#shared/contracts/openings';
import { pageQueryShape } from '#shared/contracts/paging';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** GET /my/circuits */
export const listMyCircuits = (openings: OpeningsService) =>
  defineRoute({
    method: 'get',
    path: '/my/circuits',
    summary: 'The circuits assigned to the caller',
    access: { kind: 'self', reason: 'Lists only the own work.', device: 'fallback' },
    query: z.object(pageQueryShape),
    response: circuitListSchema,
    handle: ({ caller, query }) => openings.listAssigned(caller.person, query.limit ?? 200, query.after),
  });
