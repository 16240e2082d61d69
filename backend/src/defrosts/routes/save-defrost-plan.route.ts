import * as z from 'zod/mini';
import { defrostPlanRequestSchema, savedDefrostPlanSchema } from '#shared/contracts/defrost-plans';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { DefrostPlansService } from '../defrost-plans.service';

/** POST /openings/:openingId/defrost-plan */
export const saveDefrostPlan = (plans: DefrostPlansService) =>
  defineRoute({
    method: 'post',
    path: '/openings/:openingId/defrost-plan',
    summary: 'Save the next version of an opening’s defrost plan',
    access: { kind: 'action', action: 'defrostPlan.save', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    body: defrostPlanRequestSchema,
    response: savedDefrostPlanSchema,
    status: 201,
    handle: ({ caller, params, body }) => plans.save(caller, params.openingId, body),
  });
