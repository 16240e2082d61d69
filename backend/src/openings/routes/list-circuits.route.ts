import * as z from 'zod/mini';
import { circuitListSchema } from '#shared/contracts/openings';
import { pageQueryShape } from '#shared/contracts/paging';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** GET /openings/:openingId/circuits */
export const listCircuits = (openings: OpeningsService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId/circuits',
    summary: 'Circuits of an opening in the order of the schedule',
    access: { kind: 'action', action: 'circuit.list', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    query: z.object(pageQueryShape),
    response: circuitListSchema,
    handle: ({ params, query }) => openings.listCircuits(params.openingId, query.limit ?? 100, query.after),
  });
