import * as z from 'zod/mini';
import { reviewRequestSchema, reviewResponseSchema } from '#shared/contracts/sequences';
import { sequenceIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { ReviewsService } from '../reviews.service';

/** POST /sequences/:sequenceId/reviews */
export const giveReview = (reviews: ReviewsService) =>
  defineRoute({
    method: 'post',
    path: '/sequences/:sequenceId/reviews',
    summary: 'Approve a submitted sequence with a signature, or send steps back',
    access: { kind: 'action', action: 'review.give', subject: 'sequence', param: 'sequenceId' },
    params: z.object({ sequenceId: sequenceIdSchema }),
    body: reviewRequestSchema,
    response: reviewResponseSchema,
    status: 201,
    handle: ({ caller, params, body }) => reviews.give(caller, params.sequenceId, body),
  });
