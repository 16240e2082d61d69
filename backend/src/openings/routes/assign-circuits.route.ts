import * as z from 'zod/mini';
import { assignmentRequestSchema } from '#shared/contracts/openings';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** PUT /openings/:openingId/assignments */
export const assignCircuits = (openings: OpeningsService) =>
  defineRoute({
    method: 'put',
    path: '/openings/:openingId/assignments',
    summary: 'Give circuits to somebody, or to nobody',
    access: { kind: 'action', action: 'circuit.assign', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    body: assignmentRequestSchema,
    response: 'nothing',
    handle: ({ caller, params, body }) =>
      openings.assign(caller.person, params.openingId, body.circuitIds, body.personId),
  });
