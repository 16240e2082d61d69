import * as z from 'zod/mini';
import { pageQueryShape } from '#shared/contracts/paging';
import { queueSchema } from '#shared/contracts/review-queue';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { ReviewQueueService } from '../review-queue.service';

/** GET /review-queue */
export const listReviewQueue = (queue: ReviewQueueService) =>
  defineRoute({
    method: 'get',
    path: '/review-queue',
    summary: 'Submitted circuits that wait for the caller, what is outside first',
    access: { kind: 'self', reason: 'Lists only openings in which the caller may review.' },
    query: z.object({ ...pageQueryShape, openingId: z.optional(openingIdSchema) }),
    response: queueSchema,
    handle: ({ caller, query }) => queue.list(caller.person, query.openingId, query.limit ?? 50, query.after),
  });
