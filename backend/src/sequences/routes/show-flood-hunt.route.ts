import * as z from 'zod/mini';
import { floodHuntSchema } from '#shared/contracts/flood-hunt';
import { openingIdSchema, suctionGroupIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { FloodHuntService } from '../flood-hunt.service';

/** GET /openings/:openingId/suction-groups/:suctionGroupId/coils */
export const showFloodHunt = (hunt: FloodHuntService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId/suction-groups/:suctionGroupId/coils',
    summary: 'How each coil of a suction group was left, for finding the one that sends liquid back',
    access: { kind: 'action', action: 'sequence.read', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema, suctionGroupId: suctionGroupIdSchema }),
    response: floodHuntSchema,
    handle: ({ params }) => hunt.show(params.openingId, params.suctionGroupId),
  });
