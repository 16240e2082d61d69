import * as z from 'zod/mini';
import { defrostPlanPageSchema } from '#shared/contracts/defrost-plans';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { DefrostPlansService } from '../defrost-plans.service';

/** GET /openings/:openingId/defrost-plan */
export const showDefrostPlan = (plans: DefrostPlansService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId/defrost-plan',
    summary: 'The newest defrost plan of an opening, and its circuits as the schedule has them',
    access: { kind: 'action', action: 'defrostPlan.read', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    response: defrostPlanPageSchema,
    handle: ({ params }) => plans.show(params.openingId),
  });
