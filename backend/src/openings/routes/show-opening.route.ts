import * as z from 'zod/mini';
import { openingDetailSchema } from '#shared/contracts/openings';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** GET /openings/:openingId */
export const showOpening = (openings: OpeningsService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId',
    summary: 'One opening with the state of each circuit',
    access: { kind: 'action', action: 'opening.read', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    response: openingDetailSchema,
    handle: ({ params }) => openings.show(params.openingId),
  });
